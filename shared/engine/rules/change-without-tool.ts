import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** M6 with no T before it. */
export const changeWithoutTool = defineRule({
  id: 'change-without-tool',
  group: 'tools',
  title: 'A tool change without a tool number',
  severity: 'stop',
  protects: 'The work from whatever tool the program before had chosen.',
  explanation:
    'No T stands before this M6, so the controller changes to the tool chosen last, by another program or by hand, or raises an alarm.',
  examples: { bad: 'G21 G90 G54\nM6\nM30', good: 'G21 G90 G54\nT1\nM6\nM30' },
  word: () => ({
    message: 'M6 changes the tool, but the program has not chosen one.',
    advice: 'Write the tool number before M6, or in its block.',
  }),
  observe: (_shop, report) => reportProblem(report, 'change-without-tool', () => ''),
});
