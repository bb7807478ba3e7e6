import { figure, toolWords } from './finding-data';
import { defineRule } from './rule';

/** A change that a person has to make. */
export const toolByHand = defineRule({
  id: 'tool-by-hand',
  group: 'tools',
  title: 'The tool is fitted by hand',
  severity: 'hold',
  unattended: 'stop',
  hold: 'look',
  protects: 'An unattended run from waiting, or from carrying on with the tool before.',
  explanation:
    'The loading says that this tool is fitted by hand when it is called, or the machine changes no tool by itself. A tool that stands in a pocket as well is fetched from there.',
  examples: {
    setup: { loading: { pockets: [{ pocket: 1, tool: 1 }], byHand: [2] } },
    bad: 'G21 G90 G54\nT2 M6\nM30',
    good: 'G21 G90 G54\nT1 M6\nM30',
  },
  word: (data) => ({
    message: `${toolWords(data)} has to be fitted by hand at this change.`,
    advice: `Have a person there to fit T${figure(data, 'tool')} and to see that its holder is seated, or put it into the rack.`,
  }),
  observe: (shop, report) => {
    const isManual = shop.setup.controller.toolChange === 'manual';
    return {
      toolChanging({ tool, from, place }, state) {
        if (!tool || from.number === tool.number) return;
        const isLoaded = shop.pocketsOfTool.has(tool.number);
        if (!isManual && (isLoaded || !shop.fittedByHand.has(tool.number))) return;
        const data = { tool: tool.number, name: tool.name };
        report.found({ cause: `T${tool.number}`, at: place, tool: tool.number, data }, state);
      },
    };
  },
});
