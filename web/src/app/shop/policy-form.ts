import type { AbstractControl, ValidationErrors } from '@angular/forms';
import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Units } from '#contracts';
import { fromMm, toMm } from '../ui/length';
import type { Policy } from './shop-client';

export type PolicyFormGroup = ReturnType<typeof policyFormGroup>;
export type RaiseGroup = ReturnType<typeof raiseGroup>;
export type ChipLoadGroup = ReturnType<typeof chipLoadGroup>;
type Raised = Policy['raise'][string];

const required = (value: number, least: number) =>
  new FormControl<number | null>(value, [Validators.required, Validators.min(least)]);
const text = (value: string, ...more: ((control: AbstractControl) => ValidationErrors | null)[]) =>
  new FormControl(value, { nonNullable: true, validators: [Validators.maxLength(200), ...more] });

/** The policy as it is typed: margins in per cent, chip loads in the person's units. */
export function policyFormGroup() {
  return new FormGroup({
    allowPauses: new FormControl(false, { nonNullable: true }),
    lifeMargin: required(10, 0),
    measuredWithinDays: required(30, 0.01),
    upToBlocks: required(500_000, 0),
    raise: new FormArray<RaiseGroup>([], { validators: eachRuleOnce }),
    chipLoad: new FormArray<ChipLoadGroup>([]),
  });
}

export function raiseGroup(rule = '', to: Raised = 'stop') {
  return new FormGroup({
    rule: text(rule, Validators.required),
    to: new FormControl<Raised>(to, { nonNullable: true }),
  });
}

export function chipLoadGroup(units: Units, load?: Policy['chipLoad'][number]) {
  const shown = (mm: number | undefined) =>
    new FormControl<number | null>(mm === undefined ? null : fromMm(mm, units), [
      Validators.required,
      positive,
    ]);
  return new FormGroup(
    {
      kind: text(load?.kind ?? '', Validators.required),
      material: text(load?.material ?? ''),
      from: shown(load?.from),
      to: shown(load?.to),
    },
    { validators: fromBelowTo },
  );
}

export function fillPolicy(form: PolicyFormGroup, policy: Policy, units: Units): void {
  const { raise, chipLoad } = form.controls;
  raise.clear({ emitEvent: false });
  for (const [rule, to] of Object.entries(policy.raise)) {
    raise.push(raiseGroup(rule, to), { emitEvent: false });
  }
  chipLoad.clear({ emitEvent: false });
  for (const load of policy.chipLoad) {
    chipLoad.push(chipLoadGroup(units, load), { emitEvent: false });
  }
  form.patchValue({
    allowPauses: policy.unattended.allowPauses,
    lifeMargin: Number((policy.unattended.lifeMargin * 100).toFixed(4)),
    measuredWithinDays: policy.unattended.measuredWithinDays,
    upToBlocks: policy.material.upToBlocks,
  });
  form.markAsPristine();
}

/** What is typed as a policy to store. Call it on a valid form only. */
export function policyOf(form: PolicyFormGroup, units: Units): Policy {
  const typed = form.getRawValue();
  const mm = (value: number | null): number => Number(toMm(value ?? 0, units).toFixed(4));
  return {
    unattended: {
      allowPauses: typed.allowPauses,
      lifeMargin: Number(((typed.lifeMargin ?? 0) / 100).toFixed(6)),
      measuredWithinDays: typed.measuredWithinDays ?? 30,
    },
    raise: Object.fromEntries(typed.raise.map(({ rule, to }) => [rule, to])),
    material: { upToBlocks: Math.round(typed.upToBlocks ?? 0) },
    chipLoad: typed.chipLoad.map(({ kind, material, from, to }) => ({
      kind: kind.trim(),
      ...(material.trim() ? { material: material.trim() } : {}),
      from: mm(from),
      to: mm(to),
    })),
  };
}

function positive(control: AbstractControl): ValidationErrors | null {
  const value = control.value as number | null;
  return value === null || 0 < value ? null : { positive: true };
}

function fromBelowTo(group: AbstractControl): ValidationErrors | null {
  const { from, to } = group.value as { from: number | null; to: number | null };
  return from === null || to === null || from <= to ? null : { order: true };
}

function eachRuleOnce(array: AbstractControl): ValidationErrors | null {
  const rules = (array.value as { rule: string }[]).map(({ rule }) => rule).filter(Boolean);
  return new Set(rules).size === rules.length ? null : { twice: true };
}
