import type { Tool } from '../shop/setup';
import type { MachineState, Motion, Place } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { isProgramMotion } from './mode-not-stated';
import { figure, text, toolWords } from './finding-data';
import { exampleTool } from './example-parts';
import { defineRule, type Reporter } from './rule';

/** A tool that will be worn out before the program ends. */
export const lifeShort = defineRule({
  id: 'life-short',
  group: 'tools',
  title: 'The tool’s life ends before the program does',
  severity: 'hold',
  unattended: 'stop',
  hold: 'judge',
  protects: 'The work from a dull cutter, and the dust from its heat.',
  explanation:
    'Cutting time is path length over feed with the spindle on, without the time lost in corners, so it is a little short of the real one. Only tools with a life entered are judged. Within the margin that the shop keeps for unattended runs, it is a note and stops only those.',
  examples: {
    setup: { tools: [exampleTool(1, { life: 60 }), exampleTool(2, { life: 3600 })] },
    bad: 'G21 G90 G54\nT1 M6\nS18000 M3\nG1 X100 F100\nX0\nM30',
    good: 'G21 G90 G54\nT2 M6\nS18000 M3\nG1 X100 F100\nX0\nM30',
  },
  word: (data) => ({
    message:
      text(data, 'reason') === 'margin'
        ? `${toolWords(data)} will have ${minutes(figure(data, 'leftSeconds'))} of its life left after this program, less than the margin of ${minutes(figure(data, 'marginSeconds'))} kept for unattended runs.`
        : `${toolWords(data)} needs ${minutes(figure(data, 'cutSeconds'))} of cutting here, but only ${minutes(figure(data, 'remainingSeconds'))} of its life is left.`,
    advice: `Put a fresh cutter into T${figure(data, 'tool')}, measure it and set its used time back, before the run.`,
  }),
  observe: (shop, report) => {
    const used = new Map<number, Use>();
    return {
      quiet(quiet, state) {
        const { tool } = state.held;
        if (state.turning === 'off' || tool?.life === undefined) return;
        const use = used.get(tool.number);
        quiet.feedMinutes = Math.min(
          quiet.feedMinutes,
          use ? secondsLeft(shop, use, tool) / 60 : 0,
        );
      },
      stretch({ feedMinutes }, state) {
        const use = used.get(state.held.number ?? NaN);
        if (use && state.turning !== 'off') use.cutSeconds += feedMinutes * 60;
      },
      motion(motion, state) {
        const use = useOf(used, motion, state);
        if (use) addCut(shop, use, motion, state);
      },
      programEnd(_event, state) {
        for (const use of used.values()) judge(shop, report, use, state);
      },
    };
  },
});

interface Use {
  readonly tool: number;
  cutSeconds: number;
  /** Where its life, and where the margin, is first passed. */
  pastAt: Place | undefined;
  marginAt: Place | undefined;
}

function useOf(used: Map<number, Use>, motion: Motion, state: MachineState): Use | undefined {
  if (motion.kind === 'rapid' || state.turning === 'off' || !isProgramMotion(motion))
    return undefined;
  const { tool } = state.held;
  if (tool?.life === undefined) return undefined;
  let use = used.get(tool.number);
  if (!use) {
    use = { tool: tool.number, cutSeconds: 0, pastAt: undefined, marginAt: undefined };
    used.set(tool.number, use);
  }
  return use;
}

/** Until the next place that has to be known: where the margin, then where the life, is passed. */
function secondsLeft(shop: Shop, use: Use, { life = Infinity, used }: Tool): number {
  if (use.pastAt) return Infinity;
  const { lifeMargin } = shop.setup.policy.unattended;
  return (use.marginAt ? life : life * (1 - lifeMargin)) - used - use.cutSeconds;
}

function addCut(shop: Shop, use: Use, motion: Motion, state: MachineState): void {
  if (!(motion.feed > 0)) return;
  use.cutSeconds += (motion.length / motion.feed) * 60;
  const { life = Infinity, used } = state.held.tool!;
  const spent = used + use.cutSeconds;
  if (!use.pastAt && spent > life) use.pastAt = state.place({ letters: 'XYZ' });
  if (!use.marginAt && spent > life * (1 - shop.setup.policy.unattended.lifeMargin))
    use.marginAt = state.place({ letters: 'XYZ' });
}

function judge(shop: Shop, report: Reporter, use: Use, state: MachineState): void {
  const at = use.pastAt ?? use.marginAt;
  const tool = shop.toolByNumber.get(use.tool);
  if (!at || tool?.life === undefined) return;
  const remainingSeconds = Math.max(0, tool.life - tool.used);
  const data = {
    reason: use.pastAt ? 'past' : 'margin',
    tool: tool.number,
    name: tool.name,
    cutSeconds: use.cutSeconds,
    remainingSeconds,
    leftSeconds: Math.max(0, remainingSeconds - use.cutSeconds),
    marginSeconds: tool.life * shop.setup.policy.unattended.lifeMargin,
  };
  const severity = use.pastAt ? 'hold' : 'note';
  report.found({ cause: `T${tool.number}`, at, severity, tool: tool.number, data }, state);
}

function minutes(seconds: number): string {
  return seconds < 60
    ? `${Math.round(seconds * 10) / 10} s`
    : `${Math.round(seconds / 6) / 10} min`;
}
