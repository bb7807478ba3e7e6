import { randomNumbers } from './mutate';

/** A program that steers, and the same one written out block by block by the test's own hand. */
export interface FlowProgram {
  readonly steered: string;
  readonly unrolled: string;
}

interface Making {
  readonly random: (below: number) => number;
  /** Lines of the steered program, and of its subprograms behind its end or in front of it. */
  readonly lines: string[];
  readonly subs: string[];
  /** The next free label, variable and line number. */
  next: number;
  depth: number;
}

/** What a stretch of program does, given what its variables hold. */
type Doing = (variables: Map<number, number>, moves: string[]) => void;

const MOST_DEEP = 3;

/** Loops, conditions and calls by o-words. */
export function oWordProgram(seed: number): FlowProgram {
  return assemble(seed, oWordPart, (making) => [...making.subs, 'G90', ...making.lines, 'M2']);
}

/** The same by WHILE, IF GOTO, M98 and G65. */
export function macroProgram(seed: number): FlowProgram {
  return assemble(seed, macroPart, (making) => ['G90', ...making.lines, 'M30', ...making.subs]);
}

type Part = (making: Making) => Doing;

function assemble(
  seed: number,
  part: Part,
  layOut: (making: Making) => readonly string[],
): FlowProgram {
  const making: Making = { random: randomNumbers(seed), lines: [], subs: [], next: 101, depth: 0 };
  const doing = several(making, part);
  const moves: string[] = [];
  doing(new Map(), moves);
  return {
    steered: layOut(making).join('\n'),
    unrolled: ['G90', ...moves, 'M30'].join('\n'),
  };
}

function several(making: Making, part: Part): Doing {
  const count = 1 + making.random(3);
  const doings = Array.from({ length: count }, () => part(making));
  return (variables, moves) => doings.forEach((doing) => doing(variables, moves));
}

/** A move by a number and, inside loops, a variable that counts. */
function move(making: Making, counter: number | undefined): Doing {
  const { random, lines } = making;
  const axis = 'XYZ'[random(3)]!;
  const number = random(200) / 8;
  if (counter === undefined) {
    lines.push(`G0 ${axis}${number}`);
    return (_variables, moves) => moves.push(`G0 ${axis}${number}`);
  }
  const factor = 1 + random(9);
  lines.push(`G0 ${axis}[#${counter}*${factor}+${number}]`);
  return (variables, moves) => moves.push(`G0 ${axis}${variables.get(counter)! * factor + number}`);
}

function inner(making: Making, part: Part, counter: number | undefined): Doing {
  making.depth++;
  const first = move(making, counter);
  const rest = making.depth < MOST_DEEP ? several(making, part) : move(making, counter);
  making.depth--;
  return (variables, moves) => {
    first(variables, moves);
    rest(variables, moves);
  };
}

function oWordPart(making: Making): Doing {
  const { random, lines } = making;
  const label = making.next++;
  const counter = making.next++;
  const turns = random(4);
  switch (random(6)) {
    case 0:
      return move(making, undefined);
    case 1: {
      lines.push(`o${label} repeat [${turns}]`);
      const body = inner(making, oWordPart, undefined);
      lines.push(`o${label} endrepeat`);
      return (variables, moves) => {
        for (let turn = 0; turn < turns; turn++) body(variables, moves);
      };
    }
    case 2: {
      lines.push(`#${counter}=0`, `o${label} while [#${counter} LT ${turns}]`);
      const body = inner(making, oWordPart, counter);
      lines.push(`#${counter}=[#${counter}+1]`, `o${label} endwhile`);
      return (variables, moves) => {
        for (let turn = 0; turn < turns; turn++) {
          variables.set(counter, turn);
          body(variables, moves);
        }
      };
    }
    case 3: {
      lines.push(`#${counter}=0`, `o${label} do`, `#${counter}=[#${counter}+1]`);
      const body = inner(making, oWordPart, counter);
      lines.push(`o${label} while [#${counter} LT ${turns}]`);
      return (variables, moves) => {
        for (let turn = 1; turn <= Math.max(1, turns); turn++) {
          variables.set(counter, turn);
          body(variables, moves);
        }
      };
    }
    case 4: {
      const chosen = random(3);
      lines.push(`#${counter}=${chosen}`, `o${label} if [#${counter} EQ 0]`);
      const first = inner(making, oWordPart, counter);
      lines.push(`o${label} elseif [#${counter} EQ 1]`);
      const second = inner(making, oWordPart, counter);
      lines.push(`o${label} else`);
      const third = inner(making, oWordPart, counter);
      lines.push(`o${label} endif`);
      return (variables, moves) => {
        variables.set(counter, chosen);
        [first, second, third][chosen]!(variables, moves);
      };
    }
    default:
      return callOWord(making, label);
  }
}

function callOWord(making: Making, label: number): Doing {
  const given = making.random(40);
  making.lines.push(`o${label} call [${given}]`);
  const body = subBody(making, oWordPart, [`o${label} sub`], [`o${label} endsub`]);
  return (variables, moves) => body(new Map(variables).set(1, given), moves);
}

/** Lines of a subprogram are gathered apart from those that call it. */
function subBody(
  making: Making,
  part: Part,
  head: readonly string[],
  foot: readonly string[],
): Doing {
  const own: Making = { ...making, lines: [], depth: making.depth + 1 };
  const first = move(own, 1);
  const rest = own.depth < MOST_DEEP ? several(own, part) : move(own, 1);
  making.next = own.next;
  making.subs.push(...head, ...own.lines, ...foot);
  return (variables, moves) => {
    first(variables, moves);
    rest(variables, moves);
  };
}

function macroPart(making: Making): Doing {
  const { random, lines } = making;
  const label = making.next++;
  const counter = making.next++;
  const turns = random(4);
  switch (random(5)) {
    case 0:
      return move(making, undefined);
    case 1: {
      const loop = making.depth + 1;
      lines.push(`#${counter}=0`, `WHILE [#${counter} LT ${turns}] DO${loop}`);
      const body = inner(making, macroPart, counter);
      lines.push(`#${counter}=#${counter}+1`, `END${loop}`);
      return (variables, moves) => {
        for (let turn = 0; turn < turns; turn++) {
          variables.set(counter, turn);
          body(variables, moves);
        }
      };
    }
    case 2: {
      lines.push(`#${counter}=0`, `N${label} #${counter}=#${counter}+1`);
      const body = inner(making, macroPart, counter);
      lines.push(`IF [#${counter} LT ${turns}] GOTO ${label}`);
      return (variables, moves) => {
        for (let turn = 1; turn <= Math.max(1, turns); turn++) {
          variables.set(counter, turn);
          body(variables, moves);
        }
      };
    }
    case 3: {
      lines.push(`M98 P${label} L${turns + 1}`);
      const own: Making = { ...making, lines: [], depth: MOST_DEEP };
      const body = move(own, undefined);
      making.subs.push(`O${label}`, ...own.lines, 'M99');
      return (variables, moves) => {
        for (let turn = 0; turn <= turns; turn++) body(variables, moves);
      };
    }
    default: {
      const given = random(40);
      lines.push(`G65 P${label} A${given}.`);
      // A subprogram begins its loops anew, so that their numbers are its own.
      const body = subBody(making, macroPart, [`O${label}`], ['M99']);
      return (variables, moves) => body(new Map(variables).set(1, given), moves);
    }
  }
}
