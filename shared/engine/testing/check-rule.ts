import { startCheck } from '../index';
import type { Finding, Report } from '../report/report';
import type { Rule } from '../rules/rule';
import { testSetup } from './test-shop';

/**
 * Runs a marked program and compares what one rule finds with its marks.
 *
 *     T1 M6
 *     T7 M6
 *     ^^ tool-not-loaded: T7 is in no pocket.
 *
 * Under a line stand its marks: carets under the columns, or `|` for a finding that underlines nothing;
 * then the rule id; then, where it matters, the severity in brackets (`(hold)`, `(note, unattended stop)`);
 * then, where it matters, a colon and the whole message. Marks are taken out before the program is read.
 * An unmarked program must be clean of that rule; other rules are not looked at. The first and an
 * indenting line break are not part of the program.
 */
export function checkRule(rule: Rule, change: object, marked: string): readonly Finding[] {
  const { program, marks } = readMarks(marked);
  const found = runProgram(program, change).findings.filter((each) => each.rule === rule.id);
  const missing = [...marks];
  const unexpected = found.filter((finding) => {
    const at = missing.findIndex((mark) => agrees(mark, finding));
    if (at < 0) return true;
    missing.splice(at, 1);
    return false;
  });
  if (missing.length === 0 && unexpected.length === 0) return found;
  throw new Error(
    `${rule.id} did not come out as marked (${missing.length} missing, ${unexpected.length} not expected). It came out as:\n\n${remark(program, found)}\n`,
  );
}

/** The whole report of a program in the plain test shop with a change; `rules` in place of the catalogue. */
export function runProgram(program: string, change: object = {}, rules?: readonly Rule[]): Report {
  const check = startCheck(testSetup(change), rules ? { rules } : {});
  const bytes = new TextEncoder().encode(program);
  do check.push(bytes);
  while (check.endOfText() === 'read-again');
  return check.report({ name: 'program.nc' });
}

interface Mark {
  readonly line: number;
  readonly columns: readonly [number, number] | undefined;
  readonly rule: string;
  readonly severity: string | undefined;
  readonly message: string | undefined;
}

const MARK = /^( *)(\^+|\|) ([a-z][a-z0-9-]*)(?: \(([a-z, ]+)\))?(?:: (.*))?$/;

function readMarks(marked: string): { program: string; marks: readonly Mark[] } {
  const lines: string[] = [];
  const marks: Mark[] = [];
  for (const line of marked.replace(/^\n/, '').split('\n')) {
    const mark = MARK.exec(line);
    if (!mark) {
      lines.push(line);
      continue;
    }
    const [, before = '', carets = '', rule = '', severity, message] = mark;
    const from = before.length + 1;
    const columns = carets === '|' ? undefined : ([from, from + carets.length] as const);
    marks.push({ line: Math.max(1, lines.length), columns, rule, severity, message });
  }
  return { program: lines.join('\n'), marks };
}

function agrees(mark: Mark, finding: Finding): boolean {
  return (
    mark.line === finding.line &&
    mark.rule === finding.rule &&
    mark.columns?.[0] === finding.columns?.[0] &&
    mark.columns?.[1] === finding.columns?.[1] &&
    (mark.severity === undefined || mark.severity === severityWords(finding)) &&
    (mark.message === undefined || mark.message === finding.message)
  );
}

function severityWords(finding: Finding): string {
  const { severity, unattended } = finding;
  return unattended === undefined ? severity : `${severity}, unattended ${unattended}`;
}

function remark(program: string, found: readonly Finding[]): string {
  const marksOf = (line: number) =>
    found
      .filter((finding) => finding.line === line)
      .map((finding) => {
        const [from, past] = finding.columns ?? [1, 1];
        const carets = finding.columns ? '^'.repeat(Math.max(1, past - from)) : '|';
        return `${' '.repeat(from - 1)}${carets} ${finding.rule} (${severityWords(finding)}): ${finding.message}`;
      });
  return program
    .split('\n')
    .flatMap((line, index) => [line, ...marksOf(index + 1)])
    .join('\n');
}
