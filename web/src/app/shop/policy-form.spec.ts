import { chipLoadGroup, fillPolicy, policyFormGroup, policyOf, raiseGroup } from './policy-form';
import type { Policy } from './shop-client';

const POLICY: Policy = {
  unattended: { allowPauses: true, lifeMargin: 0.07, measuredWithinDays: 14 },
  raise: { 'hand-work': 'stop' },
  material: { upToBlocks: 250_000 },
  chipLoad: [{ kind: 'compression', material: 'birch plywood', from: 0.1, to: 0.25 }],
};

describe('the policy form', () => {
  it.each(['mm', 'inch'] as const)('gives back the policy it was filled with, in %s', (units) => {
    const form = policyFormGroup();
    fillPolicy(form, POLICY, units);
    expect(form.valid).toBe(true);
    expect(policyOf(form, units)).toEqual(POLICY);
  });
  it('shows the margin in per cent', () => {
    const form = policyFormGroup();
    fillPolicy(form, POLICY, 'mm');
    expect(form.controls.lifeMargin.value).toBe(7);
  });
  it('leaves out a material nobody typed', () => {
    const form = policyFormGroup();
    form.controls.chipLoad.push(chipLoadGroup('mm', { kind: 'ball', from: 0.1, to: 0.2 }));
    expect(policyOf(form, 'mm').chipLoad).toEqual([{ kind: 'ball', from: 0.1, to: 0.2 }]);
  });
  it('refuses a chip load whose ends are swapped', () => {
    expect(chipLoadGroup('mm', { kind: 'ball', from: 0.3, to: 0.2 }).hasError('order')).toBe(true);
  });
  it('refuses one finding raised twice', () => {
    const form = policyFormGroup();
    form.controls.raise.push(raiseGroup('hand-work', 'hold'));
    form.controls.raise.push(raiseGroup('hand-work', 'stop'));
    expect(form.controls.raise.hasError('twice')).toBe(true);
  });
});
