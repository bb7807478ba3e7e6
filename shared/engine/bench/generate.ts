import { closeSync, openSync, writeSync } from 'node:fs';

export type Kind = 'carve' | 'mixed' | 'flow';

/** Bytes gathered before they are written. */
const BATCH = 1 << 20;
/** Lines between two tool changes of the mixed program. */
const CHANGE_EVERY = 50_000;
const TOOLS = 8;

/**
 * Writes a program of `lines` lines, the same on every machine. *carve* is a raster relief as posts write
 * it; *mixed* has line numbers, arcs, both kinds of comments, incremental stretches, three work offsets and
 * a tool change every 50,000 lines, with CRLF; *flow* sets parameters, moves by expressions and calls a
 * subprogram on every line in four.
 */
export function writeProgram(path: string, kind: Kind, lines: number): void {
  const file = openSync(path, 'w');
  let batch = '';
  const end = kind === 'carve' ? '\n' : '\r\n';
  const next = LINES_OF[kind]();
  for (let line = 0; line < lines; line++) {
    batch += (line === lines - 1 ? 'M30' : next(line)) + end;
    if (batch.length < BATCH) continue;
    writeSync(file, batch);
    batch = '';
  }
  writeSync(file, batch);
  closeSync(file);
}

const LINES_OF: Readonly<Record<Kind, () => (line: number) => string>> = {
  carve: carveLines,
  mixed: mixedLines,
  flow: flowLines,
};

/** Numerical Recipes' constants: any generator does, as long as it is the same everywhere. */
function randomNumbers(): () => number {
  let seed = 20_260_115;
  return () => {
    seed = (Math.imul(seed, 1_664_525) + 1_013_904_223) >>> 0;
    return seed / 0x1_0000_0000;
  };
}

function carveLines(): (line: number) => string {
  const random = randomNumbers();
  const head = ['(RELIEF)', 'G21 G90 G17 G94', 'T4 M6', 'G54 G0 X0 Y0', 'G43 H4 Z20.', 'S18000 M3'];
  let x = 0;
  let y = 0;
  let direction = 1;
  return (line) => {
    if (line < head.length) return head[line]!;
    if (line === head.length) return 'G1 Z-1. F3000';
    x += direction * (0.2 + 0.1 * random());
    if (x > 500 || x < 0) {
      direction = -direction;
      x = Math.min(500, Math.max(0, x));
      y = (y + 0.3) % 500;
    }
    const z = -2 - 1.5 * Math.sin(x / 37) * Math.cos(y / 29) - 0.2 * random();
    const feed = line % 40 === 0 ? ` F${2500 + 50 * Math.floor(20 * random())}` : '';
    return `G1 X${x.toFixed(4)} Y${y.toFixed(3)} Z${z.toFixed(4)}${feed}`;
  };
}

function mixedLines(): (line: number) => string {
  const random = randomNumbers();
  let queue: string[] = [];
  let x = 100;
  let y = 100;
  const number = (value: number) => value.toFixed(3);
  const move = () => {
    x = 20 + 560 * random();
    y = 20 + 360 * random();
  };
  const pattern = (): string[] => {
    const kind = random();
    if (kind < 0.5) {
      const side = 2 + 6 * random();
      const right = number(x + side);
      const lines = [
        `G2 X${right} Y${number(y)} I${number(side / 2)} J0. F2400`,
        `G3 X${number(x)} Y${number(y)} I${number(-side / 2)} J0.`,
        `G1 X${number(x + side)} Y${number(y + 1)}`,
        `Y${number(y)}`,
        `X${number(x)}`,
      ];
      return lines;
    }
    if (kind < 0.7) {
      const step = 1 + 3 * random();
      return [
        'G91',
        `G1 X${number(step)} Y${number(step / 2)}`,
        `X${number(-step)} Y${number(-step / 2)}`,
        'G90',
      ];
    }
    if (kind < 0.75) return [`(POCKET ${Math.floor(900 * random())})`];
    if (kind < 0.8) return [`G1 X${number(x)} Y${number(y)} ; finish`];
    const lines = ['G0 Z5.000'];
    move();
    return [...lines, `G0 X${number(x)} Y${number(y)}`, 'G1 Z-3.000 F900'];
  };
  const change = (index: number): string[] => {
    const tool = 1 + (index % TOOLS);
    move();
    return [
      'M5',
      `T${tool} M6`,
      `G${54 + (index % 3)} G90`,
      'S16000 M3',
      `G43 H${tool} G0 Z20.`,
      `G0 X${number(x)} Y${number(y)}`,
      'G1 Z-3.000 F900',
    ];
  };
  return (line) => {
    if (line === 0) return '%';
    if (line === 1) return 'N10 G21 G90 G17 G40 G49 G80 G94';
    if ((line - 2) % CHANGE_EVERY === 0) queue = ['G0 Z20.', ...change((line - 2) / CHANGE_EVERY)];
    if (queue.length === 0) queue = pattern();
    return `N${(line * 10) % 100_000} ${queue.shift()!}`;
  };
}

const FLOW_HEAD = [
  'o100 sub',
  'G1 X[#1+SIN[#2]] Y[#2*0.5] F3000',
  '#<_depth>=[#<_depth>+0.001]',
  'o100 endsub',
  '#5=0 #<_depth>=0',
  'G21 G90 G17 G94',
  'T4 M6',
  'G54 G0 X0 Y0',
  'G43 H4 Z20.',
  'S18000 M3',
  'G1 Z-1. F3000',
];

function flowLines(): (line: number) => string {
  return (line) => {
    if (line < FLOW_HEAD.length) return FLOW_HEAD[line]!;
    const at = line % 400;
    switch (line % 4) {
      case 0:
        return `#5=[${at}*0.25+COS[${at}]]`;
      case 1:
        return `G1 X#5 Y[#5/2+10]`;
      case 2:
        return `o100 call [#5] [${at}]`;
      default:
        return `G1 X[10+#5*2] Y${at / 4} Z[0-1-#5/1000]`;
    }
  };
}
