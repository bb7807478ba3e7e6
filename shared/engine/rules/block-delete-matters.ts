import { listed, text } from './finding-data';
import { defineRule, type WalkFacts } from './rule';
import { LIMIT_SLACK } from '../geometry/tolerance';

/** The block-delete switch decides what this program does. */
export const blockDeleteMatters = defineRule({
  id: 'block-delete-matters',
  group: 'reading',
  title: 'The block-delete switch changes what the program does',
  severity: 'hold',
  hold: 'look',
  protects: 'The work from a switch that stands the other way than the programmer thought.',
  explanation:
    'Blocks with “/” are read once as run and once as skipped. Reported when the two readings use other tools, reach another depth or other extents; findings that only the second has are marked as such. Where both come to the same, it is silent.',
  examples: {
    bad: 'G21 G90 G54\n/T1 M6\nM30',
    good: 'G21 G90 G54\n/M8\nM30',
  },
  word: (data) => ({
    message: `With block delete on the program ${listed(text(data, 'differs').split(' ').map(differenceWords))}.`,
    advice:
      'Set the block-delete switch as the programmer meant it, and write down which way that is.',
  }),
  observe: () => ({}),
  compare(run, skipped, report) {
    const differs = differences(run, skipped);
    if (differs.length === 0) return;
    report.found({ cause: '', at: run.firstSkippable, data: { differs: differs.join(' ') } });
  },
});

function differenceWords(what: string): string {
  if (what === 'tools') return 'uses other tools';
  return what === 'depth' ? 'reaches another depth' : 'reaches other extents';
}

function differences(run: WalkFacts, skipped: WalkFacts): readonly string[] {
  const found: string[] = [];
  if (run.tools.join() !== skipped.tools.join()) found.push('tools');
  if (differInDepth(run, skipped)) found.push('depth');
  if (differInExtent(run, skipped)) found.push('extents');
  return found;
}

function differInDepth(run: WalkFacts, skipped: WalkFacts): boolean {
  const tools = new Set([...Object.keys(run.lowest), ...Object.keys(skipped.lowest)].map(Number));
  return [...tools].some((tool) => isApart(run.lowest[tool], skipped.lowest[tool]));
}

function differInExtent(run: WalkFacts, skipped: WalkFacts): boolean {
  const one = run.extent;
  const other = skipped.extent;
  if (!one || !other) return one !== other;
  return (['x', 'y', 'z'] as const).some(
    (axis) => isApart(one.min[axis], other.min[axis]) || isApart(one.max[axis], other.max[axis]),
  );
}

function isApart(one: number | undefined, other: number | undefined): boolean {
  if (one === undefined || other === undefined) return one !== other;
  return !(Math.abs(one - other) <= LIMIT_SLACK);
}
