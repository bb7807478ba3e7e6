import { expect, test } from 'vitest';
import { mergeOver, testSetup } from '../../shared/engine/testing/test-shop';
import { checkProgram, RULES } from '#engine';
import { CLEAN_PROGRAM } from './clean-program';
import { FAULTS } from './faults';
import type { Fault } from './plant';

/** `line rule` of everything found, in the order of the report. */
function found(program: string, shop: object) {
  return checkProgram(program, testSetup(shop)).findings;
}

test.each([...new Set(FAULTS.map((fault) => fault.shop ?? {}))])(
  'the program is clear as it stands (shop %j)',
  (shop) => {
    expect(found(CLEAN_PROGRAM, shop)).toEqual([]);
  },
);

test.each(FAULTS.map((fault) => [`${fault.rule}: ${fault.story}`, fault] as const))(
  '%s',
  (_name, fault: Fault) => {
    const shop = mergeOver(fault.shop ?? {}, fault.setup ?? {}) as object;
    const findings = found(fault.text?.program ?? CLEAN_PROGRAM, shop);
    const line = fault.line ?? fault.text?.line;
    const expected = [`${line} ${fault.rule}`, ...(fault.also ?? [])];
    expect(findings.map((each) => `${each.line} ${each.rule}`).sort()).toEqual(expected.sort());
    expect(findings.find((each) => each.rule === fault.rule)).toMatchObject({
      severity: fault.severity,
      ...(fault.unattended && { unattended: fault.unattended }),
    });
  },
);

/** Rules whose fault cannot be planted in one clean program without others; each has its own specs. */
const NOT_PLANTED: Readonly<Record<string, string>> = {
  'empty-program': 'nothing is left of the program',
  'no-decimal-point': 'the clean program writes whole numbers throughout',
};

test('every rule is planted, or it is said why not', () => {
  const planted = new Set([...FAULTS.map((fault) => fault.rule), ...Object.keys(NOT_PLANTED)]);
  const groups = ['reading', 'state', 'tools', 'length', 'unattended'];
  const missing = RULES.filter((rule) => groups.includes(rule.group) && !planted.has(rule.id));
  expect(missing.map((rule) => rule.id)).toEqual(['probe-in-program']);
});
