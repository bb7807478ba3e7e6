import { text } from './finding-data';
import { defineRule } from './rule';

/** Without a job sheet the stock is guessed from work zero: said once. */
export const stockNotStated = defineRule({
  id: 'stock-not-stated',
  group: 'travel-and-clearance',
  title: 'The job sheet does not say where the stock lies',
  severity: 'note',
  protects: 'The reader from taking a guess about the stock for knowledge.',
  explanation:
    'Rapids, spindle, feeds and dwells are judged by whether the tip is in the stock. Where the job sheet states none, everything under Z zero counts as stock when zero is on its top; when zero is on the board, what needs the stock is not judged at all. It is said once, at the first feed move.',
  examples: {
    setup: { job: undefined },
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5\nM30',
  },
  word: (data) => ({
    message:
      text(data, 'zeroOn') === 'board'
        ? 'The job sheet states no stock and Z zero is on the board, so whether the tip is in the stock is not judged.'
        : 'The job sheet states no stock, so everything under Z zero counts as stock here.',
    advice: 'Enter the stock in the job sheet and check again.',
  }),
  observe: (shop, report) => {
    const { job } = shop.setup;
    if (job?.stock) return {};
    let isSaid = false;
    return {
      quiet({ feed }) {
        if (!isSaid) feed.close();
      },
      motion(motion, state) {
        if (isSaid || (motion.kind !== 'feed' && motion.kind !== 'arc')) return;
        isSaid = true;
        report.found(
          { cause: '', at: state.place(), data: { zeroOn: job?.zeroOn ?? 'top' } },
          state,
        );
      },
    };
  },
});
