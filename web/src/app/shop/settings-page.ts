import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { MatSnackBar } from '@angular/material/snack-bar';
import { firstValueFrom } from 'rxjs';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { Notice } from '../ui/notice/notice';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { chipLoadGroup, fillPolicy, policyFormGroup, policyOf, raiseGroup } from './policy-form';
import type { RaisableRule } from './raisable-rules';
import { readRaisableRules } from './raisable-rules';
import { ShopClient } from './shop-client';

/** The limit is typed in binary megabytes, as the server words it: 256 MB are 268 435 456 bytes. */
const MB = 1024 ** 2;

/** The shop's name, how large a file may be, and the policy every check is held to. */
@Component({
  selector: 'nl-settings-page',
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
    Notice,
    ReactiveFormsModule,
  ],
  templateUrl: './settings-page.html',
  styleUrl: './settings-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettingsPage implements HoldsUnsaved {
  readonly #client = inject(ShopClient);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);

  protected readonly units = this.#user.units;
  protected readonly mayChange = computed(() => this.#user.may('set-policy'));
  protected readonly ready = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly shopProblem = signal<ProblemError | null>(null);
  protected readonly policyProblem = signal<ProblemError | null>(null);
  protected readonly saving = signal(false);
  protected readonly rules = signal<readonly RaisableRule[]>([]);
  protected readonly policy = policyFormGroup();
  protected readonly shop = new FormGroup({
    name: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(200)],
    }),
    limit: new FormControl<number | null>(null, [
      Validators.required,
      Validators.min(1),
      Validators.max(4096),
    ]),
  });

  constructor() {
    void this.read();
  }

  hasUnsaved(): boolean {
    return this.shop.dirty || this.policy.dirty;
  }

  protected async read(): Promise<void> {
    try {
      const [shop, policy, rules] = await Promise.all([
        firstValueFrom(this.#client.shop()),
        firstValueFrom(this.#client.policy()),
        readRaisableRules(),
      ]);
      this.rules.set(rules);
      this.shop.reset({ name: shop.name, limit: Number((shop.uploadLimitBytes / MB).toFixed(3)) });
      fillPolicy(this.policy, policy, this.units());
      if (!this.mayChange()) {
        this.shop.disable();
        this.policy.disable();
      }
      this.problem.set(null);
      this.ready.set(true);
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }

  protected async saveShop(): Promise<void> {
    this.shop.markAllAsTouched();
    if (this.shop.invalid || this.saving()) return;
    const { name, limit } = this.shop.getRawValue();
    const change = { name, uploadLimitBytes: Math.round((limit ?? 0) * MB) };
    await this.#save(this.shopProblem, 'The shop’s settings are saved.', async () => {
      const saved = await firstValueFrom(this.#client.changeShop(change));
      this.#user.shopChanged(saved);
      this.shop.markAsPristine();
    });
  }

  protected async savePolicy(): Promise<void> {
    this.policy.markAllAsTouched();
    if (this.policy.invalid || this.saving()) return;
    const said = 'The policy is saved. Checks from now on are held to it.';
    await this.#save(this.policyProblem, said, async () => {
      await firstValueFrom(this.#client.setPolicy(policyOf(this.policy, this.units())));
      this.policy.markAsPristine();
    });
  }

  protected addRaise(): void {
    this.policy.controls.raise.push(raiseGroup());
    this.policy.markAsDirty();
  }
  protected takeRaise(index: number): void {
    this.policy.controls.raise.removeAt(index);
    this.policy.markAsDirty();
  }
  protected addChipLoad(): void {
    this.policy.controls.chipLoad.push(chipLoadGroup(this.units()));
    this.policy.markAsDirty();
  }
  protected takeChipLoad(index: number): void {
    this.policy.controls.chipLoad.removeAt(index);
    this.policy.markAsDirty();
  }

  async #save(
    problem: { set(value: ProblemError | null): void },
    said: string,
    act: () => Promise<void>,
  ): Promise<void> {
    this.saving.set(true);
    problem.set(null);
    try {
      await act();
      this.#snackBar.open(said);
    } catch (error) {
      problem.set(toProblemError(error));
    } finally {
      this.saving.set(false);
    }
  }
}
