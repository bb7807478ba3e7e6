import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import type { FormArray } from '@angular/forms';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { map } from 'rxjs';
import { CurrentUser } from '../sign-in/current-user';
import { formatLength } from '../ui/length';
import { jobFormGroup, obstacleGroup, typedOf } from './job-form-group';
import type { ObstacleGroup } from './job-form-group';
import type { JobDocument } from './job-sheet';
import { CORNERS, SIDES, WORK_OFFSETS, jobDocument, twistedSides, typedJob } from './job-sheet';

/** The job sheet of a program: the stock, where zero stands on it, and what lies in the way. */
@Component({
  selector: 'nl-job-form',
  imports: [
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MatSuffix,
    ReactiveFormsModule,
  ],
  templateUrl: './job-form.html',
  styleUrl: './job-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobForm {
  readonly #user = inject(CurrentUser);

  readonly job = input.required<JobDocument | null>();
  /** 0 while no sheet was ever saved. */
  readonly revision = input.required<number>();
  readonly saving = input(false);
  readonly saved = output<JobDocument>();

  protected readonly corners = CORNERS;
  protected readonly offsets = WORK_OFFSETS;
  protected readonly sides = SIDES;
  protected readonly units = this.#user.units;
  protected readonly form = jobFormGroup();
  protected readonly mayChange = computed(() => this.#user.may('change-job-sheet'));
  /** Whether something is typed that is not saved. */
  readonly touched = signal(false);

  readonly #value = toSignal(this.form.valueChanges.pipe(map(() => this.form.getRawValue())), {
    initialValue: this.form.getRawValue(),
  });
  protected readonly hasStock = computed(() => this.#value().hasStock);
  protected readonly isMeasured = computed(() => this.#value().corner === 'measured');
  protected readonly lift = computed(() => {
    const { lift, zeroOn, hasStock } = this.#value();
    if (!lift || !hasStock) return null;
    const face = zeroOn === 'top' ? 'top' : 'underside';
    return `The saved sheet puts the stock’s ${face} at Z ${formatLength(lift, this.units())}, and that stays.`;
  });
  protected readonly act = computed(() =>
    this.saving() ? 'Saving…' : `Save as job sheet ${this.revision() + 1}`,
  );

  constructor() {
    effect(() => {
      const typed = typedJob(this.job(), this.units());
      untracked(() => this.#fill(typed));
    });
    effect(() => {
      if (this.mayChange()) untracked(() => this.form.enable({ emitEvent: false }));
      else untracked(() => this.form.disable({ emitEvent: false }));
    });
    // A change by hand marks the form dirty; filling it does not.
    this.form.valueChanges.pipe(map(() => this.form.dirty)).subscribe((dirty) => {
      if (dirty) this.touched.set(true);
    });
  }

  protected get obstacles(): FormArray<ObstacleGroup> {
    return this.form.controls.obstacles;
  }

  protected addObstacle(): void {
    this.obstacles.push(obstacleGroup());
    this.form.markAsDirty();
    this.touched.set(true);
  }

  protected takeObstacle(index: number): void {
    this.obstacles.removeAt(index);
    this.form.markAsDirty();
    this.touched.set(true);
  }

  protected twists(index: number): readonly string[] {
    const sides = this.#value().obstacles[index]?.sides;
    return sides ? twistedSides(sides) : [];
  }

  protected save(): void {
    this.form.markAllAsTouched();
    if (this.saving() || !this.form.valid) return;
    this.saved.emit(jobDocument(typedOf(this.form), this.units()));
  }

  protected drop(): void {
    this.#fill(typedJob(this.job(), this.units()));
  }

  /** Called by the page once what is typed is stored. */
  settle(): void {
    this.form.markAsPristine();
    this.touched.set(false);
  }

  /** Rows that stay are kept and refilled, so that focus and drawing are not thrown away. */
  #fill(typed: ReturnType<typeof typedJob>): void {
    const rows = this.obstacles;
    while (typed.obstacles.length < rows.length) rows.removeAt(-1, { emitEvent: false });
    while (rows.length < typed.obstacles.length) rows.push(obstacleGroup(), { emitEvent: false });
    const obstacles = typed.obstacles.map((each) => ({ ...each, sides: [...each.sides] }));
    this.form.reset({ ...typed, obstacles });
    this.touched.set(false);
    if (!this.mayChange()) this.form.disable({ emitEvent: false });
  }
}
