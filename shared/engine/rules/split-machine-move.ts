import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A machine-coordinate or home word whose axis words slipped into the next block. */
export const splitMachineMove = defineRule({
  id: 'split-machine-move',
  group: 'state',
  title: 'A machine-coordinate word is parted from its axis words',
  severity: 'stop',
  protects: 'The stock and the spindle from a retract that runs in work coordinates.',
  explanation:
    'G53 holds for its own block only. When a line break falls between it and its axis words, it moves nothing, and the axis words of the next block are read in work coordinates: Z0 is then the top of the stock.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG0 G53\nZ0\nM30',
    good: 'G21 G90 G54\nT1 M6\nG0 G53 Z0\nM30',
  },
  word: (data) => ({
    message: `${text(data, 'code') || 'G53'} stands without axis words, and those of the next block run in work coordinates.`,
    advice: `Write the axis words in the block of ${text(data, 'code') || 'G53'}.`,
  }),
  observe: (_shop, report) =>
    reportProblem(report, 'split-machine-move', (facts) => text(facts, 'code')),
});
