import type { Observer, Problem } from '../interpreter/events';
import type { FindingData } from '../report/report';
import type { Reporter } from './rule';

/**
 * For a rule whose fault the reading stages or the interpreter see themselves: takes the facts over as
 * the finding's figures. `causeOf` tells one episode from another; by default what is written.
 */
export function reportProblem(
  report: Reporter,
  problem: Problem,
  causeOf: (facts: FindingData) => string = defaultCause,
): Observer {
  return {
    problem(event, state) {
      if (event.problem !== problem) return;
      const data = { ...event.facts };
      const by = data['by'];
      report.found(
        { cause: causeOf(data), by: typeof by === 'number' ? by : 0, at: event.place, data },
        state,
      );
    },
  };
}

function defaultCause(facts: FindingData): string {
  return `${String(facts['reason'] ?? '')} ${String(facts['what'] ?? facts['code'] ?? '')}`;
}
