import type { Label, LabelledFlow } from '../statements/statement';
import type { Mark } from './find-marks';

/** What a line that shapes the text has to know of the others it belongs to. */
export type Link =
  /** `next`: where a false condition leads, to elseif, else or endif. */
  | { readonly kind: 'if' | 'elseif'; next: number; end: number }
  | { readonly kind: 'else'; end: number }
  | { readonly kind: 'endif' }
  /** A loop by its first line; `end` is its last. */
  | { readonly kind: 'while' | 'do' | 'repeat'; end: number }
  /** The last line of a loop; 'again' where it is `while [c]` behind a do. */
  | { readonly kind: 'endloop' | 'again'; readonly begin: number }
  | { readonly kind: 'break' | 'continue'; readonly loop: { readonly begin: number; end: number } }
  | { readonly kind: 'sub'; end: number }
  | { readonly kind: 'endsub' | 'return' };

export interface ShapeFault {
  readonly line: number;
  /** Byte range within the line. */
  readonly from: number;
  readonly to: number;
  readonly reason: 'flow-unpaired' | 'flow-open' | 'flow-label' | 'flow-crossing' | 'flow-depth';
  /** What it lacks or meets, as written: 'endwhile', 'DO2'. */
  readonly other: string;
}

export interface Shapes {
  readonly links: ReadonlyMap<number, Link>;
  readonly loops: readonly LoopRange[];
  /** First line of each subroutine, by the key of its label. */
  readonly subs: ReadonlyMap<string, number>;
  /** In the order of their lines. */
  readonly faults: readonly ShapeFault[];
}
export interface LoopRange {
  readonly begin: number;
  end: number;
}

/** DO and END take 1, 2 or 3 (facts sheet 12.1.6). */
const MOST_LOOPS = 3;
/** Further ones say nothing new. */
const MOST_FAULTS = 1_000;

interface Open {
  readonly mark: Mark;
  readonly keyword: string;
  readonly key: string;
  readonly link: { end: number; next?: number };
  /** The branch whose condition leads on to the next one. */
  branch: { next: number; end: number } | undefined;
  readonly branches: { readonly line: number; readonly link: { end: number } }[];
  readonly loop: LoopRange | undefined;
}

/** The key of a label that is written out; undefined when it has to be worked out. */
export function labelKey(label: Label): string | undefined {
  if ('name' in label) return `<${label.name}>`;
  return label.number.kind === 'number' ? String(label.number.value) : undefined;
}

/**
 * Finds what belongs together: conditions with their ends, loops with theirs. A part without its other parts is
 * a fault (facts sheet 12.1.6, 12.2.5) and gets no link, so that the walk passes over it.
 */
export function pairShapes(marks: readonly Mark[]): Shapes {
  const pairing = new Pairing();
  for (const mark of marks) pairing.take(mark);
  return pairing.finish();
}

class Pairing {
  private readonly links = new Map<number, Link>();
  private readonly loops: LoopRange[] = [];
  private readonly subs = new Map<string, number>();
  private readonly faults: ShapeFault[] = [];
  private readonly open: Open[] = [];
  /** What each label has been used for, by its opening word. */
  private readonly used = new Map<string, string>();

  take(mark: Mark): void {
    const { flow } = mark;
    if (flow.kind === 'while') this.openMacroLoop(mark, flow.loop);
    else if (flow.kind === 'end') this.closeMacroLoop(mark, flow.loop);
    else this.takeLabelled(mark, flow);
  }

  finish(): Shapes {
    this.closeDownTo(0);
    for (const [line, link] of this.links)
      if ('loop' in link && link.loop.end === 0) this.links.delete(line);
    this.faults.sort((one, other) => one.line - other.line);
    const { links, loops, subs, faults } = this;
    return { links, loops: loops.filter(({ end }) => end > 0), subs, faults };
  }

  private openMacroLoop(mark: Mark, loop: number): void {
    if (loop < 1 || loop > MOST_LOOPS) return this.fault(mark, 'flow-depth', `DO${loop}`);
    // A loop inside one of the same number would end it.
    if (this.open.some(({ key }) => key === `DO${loop}`))
      return this.fault(mark, 'flow-crossing', `DO${loop}`);
    this.openLoop(mark, 'while', `DO${loop}`);
  }

  private closeMacroLoop(mark: Mark, loop: number): void {
    const key = `DO${loop}`;
    const at = this.open.findIndex((each) => each.key === key);
    if (at < 0) return this.fault(mark, 'flow-unpaired', key);
    const inner = this.open[this.open.length - 1]!;
    if (at < this.open.length - 1) this.fault(mark, 'flow-crossing', inner.key);
    this.closeDownTo(at + 1);
    this.closeLoop(mark, 'endloop');
  }

  private takeLabelled(mark: Mark, { label, keyword }: LabelledFlow): void {
    const key = labelKey(label);
    if (keyword === 'call') return;
    // What began in one program cannot go on in the next.
    if (keyword === 'program') {
      this.closeDownTo(0);
      return this.used.clear();
    }
    if (key === undefined) return this.fault(mark, 'flow-label', '');
    switch (keyword) {
      case 'sub':
        return this.openSub(mark, key);
      case 'endsub':
        return this.closeSub(mark, key);
      case 'return':
        return this.takeReturn(mark);
      case 'if':
        return this.openIf(mark, key);
      case 'elseif':
      case 'else':
        return this.takeBranch(mark, key, keyword);
      case 'endif':
        return this.closeIf(mark, key);
      case 'while':
        return this.takeWhile(mark, key);
      case 'do':
      case 'repeat':
        this.claim(mark, key, keyword);
        return this.openLoop(mark, keyword, key);
      case 'endwhile':
        return this.endLoop(mark, key, 'while');
      case 'endrepeat':
        return this.endLoop(mark, key, 'repeat');
      case 'break':
      case 'continue':
        return this.leaveLoop(mark, key, keyword);
    }
  }

  private openSub(mark: Mark, key: string): void {
    this.claim(mark, key, 'sub');
    // A subroutine inside another, or inside a loop, is none.
    this.closeDownTo(0);
    if (!this.subs.has(key)) this.subs.set(key, mark.line);
    this.push(mark, 'sub', key, { kind: 'sub', end: 0 });
  }

  private closeSub(mark: Mark, key: string): void {
    const at = this.find(key, 'sub');
    if (at < 0) return this.fault(mark, 'flow-unpaired', 'sub');
    this.closeDownTo(at + 1);
    this.open.pop()!.link.end = mark.line;
    this.links.set(mark.line, { kind: 'endsub' });
  }

  private takeReturn(mark: Mark): void {
    if (!this.open.some(({ keyword }) => keyword === 'sub'))
      this.fault(mark, 'flow-unpaired', 'sub');
    else this.links.set(mark.line, { kind: 'return' });
  }

  private openIf(mark: Mark, key: string): void {
    this.claim(mark, key, 'if');
    const link = { kind: 'if' as const, next: 0, end: 0 };
    const open = this.push(mark, 'if', key, link);
    open.branch = link;
    open.branches.push({ line: mark.line, link });
  }

  private takeBranch(mark: Mark, key: string, keyword: 'elseif' | 'else'): void {
    const at = this.find(key, 'if');
    const open = this.open[at];
    if (!open?.branch) return this.fault(mark, 'flow-unpaired', 'if');
    this.closeDownTo(at + 1);
    open.branch.next = mark.line;
    const link = { kind: keyword, next: 0, end: 0 };
    open.branch = keyword === 'elseif' ? link : undefined;
    open.branches.push({ line: mark.line, link });
    this.links.set(mark.line, link);
  }

  private closeIf(mark: Mark, key: string): void {
    const at = this.find(key, 'if');
    if (at < 0) return this.fault(mark, 'flow-unpaired', 'if');
    this.closeDownTo(at + 1);
    const { branch, branches } = this.open.pop()!;
    if (branch) branch.next = mark.line;
    for (const { link } of branches) link.end = mark.line;
    this.links.set(mark.line, { kind: 'endif' });
  }

  /** Behind a do of its label a while ends that loop; else it begins one. */
  private takeWhile(mark: Mark, key: string): void {
    const at = this.find(key, 'do');
    if (at < 0) {
      this.claim(mark, key, 'while');
      return this.openLoop(mark, 'while', key);
    }
    this.closeDownTo(at + 1);
    this.closeLoop(mark, 'again');
  }

  private endLoop(mark: Mark, key: string, keyword: 'while' | 'repeat'): void {
    const at = this.find(key, keyword);
    if (at < 0) return this.fault(mark, 'flow-unpaired', keyword);
    this.closeDownTo(at + 1);
    this.closeLoop(mark, 'endloop');
  }

  private leaveLoop(mark: Mark, key: string, kind: 'break' | 'continue'): void {
    const loop = this.open.find((each) => each.key === key && each.loop)?.loop;
    if (!loop) return this.fault(mark, 'flow-unpaired', 'loop');
    this.links.set(mark.line, { kind, loop });
  }

  private openLoop(mark: Mark, kind: 'while' | 'do' | 'repeat', key: string): void {
    const loop = { begin: mark.line, end: 0 };
    this.push(mark, kind, key, { kind, end: 0 }, loop);
    this.loops.push(loop);
  }

  private closeLoop(mark: Mark, kind: 'endloop' | 'again'): void {
    const { link, loop } = this.open.pop()!;
    link.end = mark.line;
    loop!.end = mark.line;
    this.links.set(mark.line, { kind, begin: loop!.begin });
  }

  private push(
    mark: Mark,
    keyword: string,
    key: string,
    link: Link & { end: number },
    loop?: LoopRange,
  ): Open {
    this.links.set(mark.line, link);
    const open: Open = { mark, keyword, key, link, branch: undefined, branches: [], loop };
    this.open.push(open);
    return open;
  }

  private find(key: string, keyword: string): number {
    return this.open.findLastIndex((each) => each.key === key && each.keyword === keyword);
  }

  /** Takes what stands open above this depth for left open. */
  private closeDownTo(depth: number): void {
    while (this.open.length > depth) {
      const { mark, keyword, key, branches } = this.open.pop()!;
      this.links.delete(mark.line);
      for (const { line } of branches) this.links.delete(line);
      this.fault(mark, 'flow-open', endOf(keyword, key));
    }
  }

  /** A label belongs to one construct of a text. */
  private claim(mark: Mark, key: string, keyword: string): void {
    const before = this.used.get(key);
    if (before !== undefined) this.fault(mark, 'flow-label', before);
    else this.used.set(key, keyword);
  }

  private fault(mark: Mark, reason: ShapeFault['reason'], other: string): void {
    if (this.faults.length >= MOST_FAULTS) return;
    const { from, to } = mark.flow;
    this.faults.push({ line: mark.line, from, to, reason, other });
  }
}

function endOf(keyword: string, key: string): string {
  if (key.startsWith('DO')) return `END${key.slice(2)}`;
  return keyword === 'do' ? 'while' : `end${keyword}`;
}
