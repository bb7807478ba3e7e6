import { figure } from './finding-data';
import { defineRule } from './rule';
import { meaningsInMm, watchToolComments } from './watch-tool-comments';

/** Two cutters under one number in one file. */
export const oneNumberTwoTools = defineRule({
  id: 'one-number-two-tools',
  group: 'tools',
  title: 'One tool number stands for two cutters',
  severity: 'stop',
  protects: 'Half of the work from being cut with the other cutter.',
  explanation:
    'Two comments of one program give one tool number two diameters, more than 0.05 mm apart: two cutters were posted with one number. Only sizes that can be read in one way are compared, and tapered or pointed cutters are left out.',
  examples: {
    bad: '(T2 D=6. CR=0. - ZMIN=-5 - FLAT END MILL)\n(T2 D=3.175 CR=0. - ZMIN=-2 - FLAT END MILL)\nG21 G90 G54\nG0 X0\nM30',
    good: '(T2 D=6. CR=0. - ZMIN=-5 - FLAT END MILL)\n(T5 D=3. CR=0. - ZMIN=-2 - FLAT END MILL)\nG21 G90 G54\nT2 M6 (6MM END MILL)\nG0 X0\nM30',
  },
  word: (data, lengths) => ({
    message: `T${figure(data, 'tool')} is ${lengths.length(figure(data, 'written'))} across in this comment and ${lengths.length(figure(data, 'first'))} in the one of line ${figure(data, 'firstLine')}.`,
    advice: 'Give the two cutters numbers of their own and post the program again.',
  }),
  observe: (_shop, report) => {
    const first = new Map<number, { readonly mm: number; readonly line: number }>();
    return watchToolComments((comment, state) => {
      const [mm, ...others] = meaningsInMm(comment);
      if (mm === undefined || others.length > 0 || comment.isTapered) return;
      const known = first.get(comment.about);
      if (!known) {
        first.set(comment.about, { mm, line: comment.place.line });
        return;
      }
      if (Math.abs(known.mm - mm) <= SAME_DIAMETER) return;
      const data = { tool: comment.about, written: mm, first: known.mm, firstLine: known.line };
      const cause = `T${comment.about}`;
      report.found({ cause, at: comment.place, tool: comment.about, data }, state);
    });
  },
});

/** The same as where a comment is held against the tool list (mm). */
const SAME_DIAMETER = 0.05;
