import type { AbstractControl, ValidationErrors } from '@angular/forms';
import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Corner, TypedJob, TypedObstacle } from './job-sheet';
import { BLANK_JOB, SIDES, twistedSides } from './job-sheet';

export type JobFormGroup = ReturnType<typeof jobFormGroup>;
export type ObstacleGroup = ReturnType<typeof obstacleGroup>;

/** The fields of a job sheet. Sizes are asked for only while there is stock. */
export function jobFormGroup() {
  return new FormGroup(
    {
      hasStock: kept(BLANK_JOB.hasStock),
      in: kept(BLANK_JOB.in),
      sizeX: new FormControl<number | null>(null),
      sizeY: new FormControl<number | null>(null),
      thickness: new FormControl<number | null>(null),
      corner: kept<Corner>(BLANK_JOB.corner),
      atX: new FormControl<number | null>(0),
      atY: new FormControl<number | null>(0),
      material: kept('', Validators.maxLength(200)),
      zeroOn: kept<'top' | 'board'>(BLANK_JOB.zeroOn),
      lift: kept(0),
      obstacles: new FormArray<ObstacleGroup>([]),
    },
    { validators: stockIsWhole },
  );
}

export function obstacleGroup(typed?: TypedObstacle) {
  return new FormGroup({
    name: kept(typed?.name ?? '', Validators.required, Validators.maxLength(200)),
    in: kept(typed?.in ?? 'G54'),
    sides: new FormArray(
      SIDES.map((_side, index) => new FormControl<number | null>(typed?.sides[index] ?? null)),
      { validators: sidesInOrder },
    ),
  });
}

export function typedOf(form: JobFormGroup): TypedJob {
  return form.getRawValue();
}

function kept<T>(
  value: T,
  ...validators: ((control: AbstractControl) => ValidationErrors | null)[]
) {
  return new FormControl(value, { nonNullable: true, validators });
}

/** Marks each size field itself, so that the message stands under the field that lacks it. */
function stockIsWhole(group: AbstractControl): ValidationErrors | null {
  const { hasStock, sizeX, sizeY, thickness, corner, atX, atY } = group.value as TypedJob;
  const isMissing: Record<string, boolean> = {
    sizeX: hasStock && !isPositive(sizeX),
    sizeY: hasStock && !isPositive(sizeY),
    thickness: hasStock && !isPositive(thickness),
    atX: hasStock && corner === 'measured' && typeof atX !== 'number',
    atY: hasStock && corner === 'measured' && typeof atY !== 'number',
  };
  for (const [name, missing] of Object.entries(isMissing)) {
    const control = group.get(name);
    if (!control) continue;
    if (missing !== control.hasError('size')) control.setErrors(missing ? { size: true } : null);
  }
  return Object.values(isMissing).includes(true) ? { stock: true } : null;
}

function isPositive(value: number | null | undefined): boolean {
  return typeof value === 'number' && 0 < value;
}

function sidesInOrder(control: AbstractControl): ValidationErrors | null {
  const sides = control.value as readonly (number | null)[];
  return twistedSides(sides).length ? { twisted: true } : null;
}
