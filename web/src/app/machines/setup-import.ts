import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { firstValueFrom } from 'rxjs';
import type { MachineDetails } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { ToolClient } from '../tools/tool-client';
import { counted, formatBytes } from '../ui/count';
import { writePath } from '../ui/facts/wrong-facts';
import { Notice } from '../ui/notice/notice';
import { MachineClient } from './machine-client';
import { readSetup } from './read-setup';
import { summarizeSetup } from './summarize-setup';

/** A setup of a large shop is some hundred kilobytes; the server takes no document beyond this. */
const LARGEST_FILE = 8_000_000;

/**
 * A setup file on its way in: read, held against the contract, shown as what it would change, and
 * only then sent. What is wrong in it is named by path, all at once.
 */
@Component({
  selector: 'nl-setup-import',
  imports: [FormsModule, MatButton, MatCheckbox, MatFormField, MatInput, MatLabel, Notice],
  templateUrl: './setup-import.html',
  styleUrl: './setup-import.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetupImport {
  readonly #client = inject(MachineClient);
  readonly #tools = inject(ToolClient);
  readonly #user = inject(CurrentUser);

  /** The machine to revise; null: the file makes a new one. */
  readonly machine = input<MachineDetails | null>(null);
  readonly imported = output<MachineDetails>();

  readonly #toolList = rxResource({ stream: () => this.#tools.list() });
  readonly #text = signal<string | null>(null);
  protected readonly fileName = signal('');
  protected readonly tooLarge = signal('');
  protected readonly reason = signal('');
  protected readonly replaceTools = signal(false);
  protected readonly sending = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly over = signal(false);

  protected readonly read = computed(() => {
    const text = this.#text();
    return text === null ? null : readSetup(text);
  });
  protected readonly wrong = computed(() => {
    const read = this.read();
    if (read?.kind !== 'wrong') return [];
    return read.wrong.map(({ path, sentence }) => ({
      path: writePath(path) || 'the file',
      sentence,
    }));
  });
  protected readonly wrongHeading = computed(
    () =>
      `${counted(this.wrong().length, 'place')} in ${this.fileName()} to put right; nothing was imported.`,
  );
  protected readonly summary = computed(() => {
    const read = this.read();
    if (read?.kind !== 'setup' || !this.#toolList.hasValue()) return null;
    return summarizeSetup(read.setup, this.machine(), this.#toolList.value(), this.#user.units());
  });
  protected readonly changesAnything = computed(() => {
    const summary = this.summary();
    if (!summary) return false;
    const parts = summary.parts.some((part) => 0 < part.changes.length);
    return parts || 0 < summary.newTools.length + summary.differingTools.length;
  });
  protected readonly waitsForTools = computed(
    () => 0 < (this.summary()?.differingTools.length ?? 0) && !this.replaceTools(),
  );
  protected readonly listProblem = computed(() => {
    const error = this.#toolList.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly act = computed(() =>
    this.machine() ? 'Import as new revisions' : 'Add this machine',
  );

  protected fetchTools(): void {
    this.#toolList.reload();
  }
  protected async choose(event: Event): Promise<void> {
    const field = event.target as HTMLInputElement;
    const file = field.files?.[0];
    if (file) await this.#take(file);
    // The same file, mended and chosen again, must count as a new choice.
    field.value = '';
  }
  protected async drop(event: DragEvent): Promise<void> {
    event.preventDefault();
    this.over.set(false);
    const file = event.dataTransfer?.files[0];
    if (file) await this.#take(file);
  }
  protected hover(event: DragEvent): void {
    event.preventDefault();
    this.over.set(true);
  }
  protected forget(): void {
    this.#text.set(null);
    this.fileName.set('');
    this.problem.set(null);
  }

  protected async send(): Promise<void> {
    const read = this.read();
    if (read?.kind !== 'setup') return;
    const document = {
      setup: read.setup,
      reason: this.reason(),
      replaceTools: this.replaceTools(),
    };
    const machine = this.machine();
    this.sending.set(true);
    this.problem.set(null);
    try {
      const details = await firstValueFrom(
        machine
          ? this.#client.importSetup(machine.id, document)
          : this.#client.addMachine(document),
      );
      this.forget();
      this.imported.emit(details);
    } catch (error) {
      this.problem.set(toProblemError(error));
    } finally {
      this.sending.set(false);
    }
  }

  async #take(file: File): Promise<void> {
    this.forget();
    this.tooLarge.set('');
    if (LARGEST_FILE < file.size) {
      this.tooLarge.set(
        `${file.name} is ${formatBytes(file.size)}; a setup file is at most ${formatBytes(LARGEST_FILE)}. Is it a program?`,
      );
      return;
    }
    this.fileName.set(file.name);
    this.#text.set(await file.text());
  }
}
