import type { Units } from '#contracts';
import { formatLength } from '../ui/length';
import type { PathMark } from '../ui/table-plan/draw-path';
import { formatCount } from '../ui/count';
import type { ShownFinding } from './shown-finding';

/** What the table plan says at the worst place of a finding, and where on the path that is. */
export function markOnPlan(shown: ShownFinding, units: Units): PathMark {
  const { finding, severity } = shown;
  const line = finding.worstLine;
  const { axis, at, by } = finding.data;
  const base = {
    line,
    severity,
    words: `line ${formatCount(line)}`,
    ...(shown.tool === null ? {} : { tool: shown.tool }),
  };
  if ((axis !== 'x' && axis !== 'y') || typeof at !== 'number') return base;
  const words =
    finding.rule === 'beyond-travel' && typeof by === 'number'
      ? `${formatLength(by, units)} past travel`
      : base.words;
  return { ...base, words, axis, at };
}
