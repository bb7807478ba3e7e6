import { ownDiameterNumber } from '../shop/called-as';
import { figure } from './finding-data';
import { defineRule } from './rule';

/** Cutter compensation with the diameter of another tool. */
export const diameterOffsetOtherTool = defineRule({
  id: 'diameter-offset-other-tool',
  group: 'state',
  title: 'Diameter offset of another tool',
  severity: 'hold',
  hold: 'judge',
  protects: 'The part from coming out too large or too small.',
  explanation:
    'The D number is compared with the tool in the spindle, plus the shift the controller description names between T and D numbers. A second offset kept on purpose for the same cutter is a matter of judgement. Where it is not known what the spindle holds, nothing is said.',
  examples: {
    bad: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D3\nG1 X20 F1000\nX50\nG40 X60\nM30',
    good: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X20 F1000\nX50\nG40 X60\nM30',
  },
  word: (data) => ({
    message: `D${figure(data, 'offset')} is used with T${figure(data, 'tool')} in the spindle, whose own offset is D${figure(data, 'own')}.`,
    advice: `Write D${figure(data, 'own')}, or say why the other offset is meant.`,
  }),
  observe: (shop, report) => ({
    compensation({ side, number, place }, state) {
      const held = state.held.number;
      if (side === 'off' || number === null || number === 0 || !held) return;
      const own = ownDiameterNumber(shop, held);
      if (own === undefined || number === own) return;
      const data = { offset: number, tool: held, own };
      report.found({ cause: `D${number}`, at: place, data }, state);
    },
  }),
});
