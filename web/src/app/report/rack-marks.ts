import type { RackMark } from '../ui/rack-strip/rack-slot';
import type { ShownFinding } from './shown-finding';

/** Two or three words for what a rule finds wrong with a tool or its place in the rack. */
const WORDS: Readonly<Record<string, string>> = {
  'tool-unknown': 'not in the list',
  'tool-not-loaded': 'not loaded',
  'tool-by-hand': 'by hand',
  'tool-in-two-pockets': 'in two pockets',
  'holder-family': 'wrong taper',
  'too-wide-for-pocket': 'too wide',
  'too-long-for-pocket': 'too long',
  'too-heavy': 'too heavy',
  'too-long-to-cross': 'cannot cross',
  'tool-comment-disagrees': 'not as named',
  'one-number-two-tools': 'two tools named',
  'life-short': 'life runs out',
  'not-measured': 'not measured',
  'turns-wrong-way': 'turns wrong',
  'must-not-turn': 'must not turn',
  'collet-grip': 'grip too short',
  'length-offset-disagrees': 'length differs',
  'length-offset-missing': 'no length',
  'reach-short': 'too short',
};

/** Marks for the rack strip from findings about tools: the gravest word of each rule, once a tool. */
export function marksOf(findings: readonly ShownFinding[]): readonly RackMark[] {
  const marks = new Map<string, RackMark>();
  for (const { finding, severity, tool } of findings) {
    const word = WORDS[finding.rule];
    const number = tool ?? numberOf(finding.data['tool']);
    if (!word || number === null || severity === 'note') continue;
    const key = `${number} ${finding.rule}`;
    if (marks.get(key)?.severity === 'stop') continue;
    marks.set(key, { tool: number, severity, word });
  }
  return [...marks.values()].sort((a, b) =>
    a.severity === b.severity ? 0 : a.severity === 'stop' ? -1 : 1,
  );
}

function numberOf(value: unknown): number | null {
  return typeof value === 'number' ? value : null;
}
