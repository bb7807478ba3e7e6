import { text } from './finding-data';
import { defineRule } from './rule';

/** A tool change by macro that this version cannot walk: said once, at the first change. */
export const changeNotProven = defineRule({
  id: 'change-not-proven',
  group: 'unattended',
  title: 'The tool change is not proven',
  severity: 'hold',
  unattended: 'stop',
  hold: 'judge',
  protects:
    'The rack, the spindle and whoever stands near from a change that nobody has gone through.',
  explanation:
    'This setup changes tools by running a macro. This version does not walk the macro: neither its motions nor its waits are judged. It is said once, at the first change. Where the setup holds no macro text at all, that is said in its place.',
  examples: {
    setup: {
      controller: { toolChange: 'macro' },
      changeMacro: { name: 'change.ngc', text: 'M5\nG53 G0 Z0\nM2\n' },
    },
    bad: 'G21 G90 G54\nT1 M6\nT2 M6\nM30',
    good: 'G21 G90 G54\nG0 Z5\nM30',
  },
  word: (data) =>
    text(data, 'macro') === ''
      ? {
          message: 'Tools are changed by a macro here, and the setup has no macro text.',
          advice: 'Enter the change macro of this machine, and prove each change on the machine.',
        }
      : {
          message: `The change macro ${text(data, 'macro')} was not walked: its motions and waits are not judged.`,
          advice:
            'Prove it on the machine at low override, with a dummy holder, once for every pocket this program uses.',
        },
  observe: (shop, report) => {
    if (shop.setup.controller.toolChange !== 'macro') return {};
    const macro = shop.setup.changeMacro?.name ?? '';
    let isSaid = false;
    return {
      toolChanged({ place }, state) {
        if (isSaid) return;
        isSaid = true;
        report.found({ cause: '', at: place, data: { macro } }, state);
      },
    };
  },
});
