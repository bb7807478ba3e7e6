import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { MachineDetails } from '#contracts';
import { macroTextSchema } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { LastMachine } from '../machines/last-machine';
import { MachineClient } from '../machines/machine-client';
import { CurrentUser } from '../sign-in/current-user';
import { ConflictNotice } from '../ui/conflict-notice/conflict-notice';
import { counted } from '../ui/count';
import { IntoView } from '../ui/into-view/into-view';
import { MachineTabs } from '../ui/machine-tabs/machine-tabs';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { RevisionList } from '../ui/revision-list/revision-list';
import { SaveBar } from '../ui/save-bar/save-bar';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { keepLineEnds, linesOf, linesToRead, wordChangedLines } from './macro-text';

interface Draft {
  readonly name: string;
  readonly text: string;
}

/** The tool-change macro of a machine as it is kept: read with line numbers, changed as a revision. */
@Component({
  selector: 'nl-change-macro-page',
  imports: [
    ConflictNotice,
    FormsModule,
    IntoView,
    MachineTabs,
    MatButton,
    MatFormField,
    MatInput,
    MatLabel,
    Notice,
    PageHeader,
    RevisionList,
    RouterLink,
    SaveBar,
  ],
  templateUrl: './change-macro-page.html',
  styleUrl: './change-macro-page.scss',
  host: { '(window:beforeunload)': 'holdUnload($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeMacroPage implements HoldsUnsaved {
  readonly #client = inject(MachineClient);
  readonly #last = inject(LastMachine);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);

  readonly machineId = input.required<string>();

  protected readonly list = rxResource({ stream: () => this.#client.list() });
  protected readonly details = rxResource({
    params: () => this.machineId(),
    stream: ({ params }) => this.#client.details(params),
  });
  protected readonly machine = linkedSignal<MachineDetails | null>(() =>
    this.details.hasValue() ? this.details.value() : null,
  );
  /** What is typed; null while the macro is only read. Another machine starts anew. */
  protected readonly draft = linkedSignal<string, Draft | null>({
    source: this.machineId,
    computation: () => null,
  });
  readonly #basedOn = signal<MachineDetails | null>(null);
  protected readonly theirs = signal<MachineDetails | null>(null);
  protected readonly reason = signal('');
  protected readonly saving = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);

  readonly #past = rxResource({
    params: () => {
      const machine = this.machine();
      if (!machine?.macroRevision) return undefined;
      return { id: machine.id, number: machine.macroRevision.number };
    },
    stream: ({ params }) => this.#client.revisions(params.id, 'macro'),
  });
  protected readonly revisions = computed(() => (this.#past.hasValue() ? this.#past.value() : []));

  protected readonly machines = computed(() => (this.list.hasValue() ? this.list.value() : []));
  protected readonly mayChange = computed(() => this.#user.may('change-macro'));
  protected readonly fetchProblem = computed(() => {
    const error = this.details.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly lines = computed(() => linesToRead(this.machine()?.macro?.text ?? ''));
  protected readonly lineCount = computed(() => counted(this.lines().length, 'line'));
  protected readonly walks = computed(() => this.machine()?.controller.toolChange === 'macro');
  protected readonly typedLines = computed(() => linesOf(this.draft()?.text ?? '').length);
  protected readonly numbers = computed(() =>
    Array.from({ length: this.typedLines() }, (_, index) => index + 1).join('\n'),
  );
  protected readonly nameMissing = computed(() => this.draft()?.name.trim() === '');
  protected readonly changes = computed(() => {
    const draft = this.draft();
    return draft ? wordChangedLines(this.#standing().text, draft.text) : '';
  });
  protected readonly theirChanges = computed(() => {
    const theirs = this.theirs();
    if (!theirs) return [];
    return [wordChangedLines(this.#standing().text, normal(theirs.macro?.text ?? ''))];
  });
  protected readonly act = computed(() => `Save as macro ${this.#number(this.#basedOn()) + 1}`);
  readonly #standing = computed<Draft>(() => {
    const macro = (this.#basedOn() ?? this.machine())?.macro;
    return { name: macro?.name ?? 'change.ngc', text: normal(macro?.text ?? '') };
  });

  constructor() {
    effect(() => this.#last.remember(this.machineId()));
  }

  hasUnsaved(): boolean {
    const draft = this.draft();
    const standing = this.#standing();
    return draft !== null && (draft.text !== standing.text || draft.name !== standing.name);
  }
  protected holdUnload(event: BeforeUnloadEvent): void {
    if (this.hasUnsaved()) event.preventDefault();
  }

  protected change(): void {
    this.#forget();
    this.#basedOn.set(this.machine());
    this.draft.set(this.#standing());
  }
  protected drop(): void {
    this.#forget();
    this.draft.set(null);
  }
  protected type(change: Partial<Draft>): void {
    this.draft.update((draft) => (draft ? { ...draft, ...change } : draft));
  }

  protected async save(): Promise<void> {
    const machine = this.#basedOn();
    const draft = this.draft();
    if (!machine || !draft || this.nameMissing()) return;
    if (!this.hasUnsaved()) return this.drop();
    const macro = macroTextSchema.parse({
      name: draft.name.trim(),
      text: keepLineEnds(draft.text, machine.macro?.text ?? ''),
    });
    this.saving.set(true);
    this.problem.set(null);
    try {
      const change = { basedOn: this.#number(machine), reason: this.reason(), macro };
      const saved = await firstValueFrom(this.#client.saveMacro(machine.id, change));
      this.machine.set(saved);
      this.drop();
      this.#snackBar.open(`Saved as macro ${this.#number(saved)}.`);
    } catch (error) {
      await this.#explain(toProblemError(error), machine);
    } finally {
      this.saving.set(false);
    }
  }
  /** Two texts are not merged by a machine: mine stays as typed, and saving it replaces theirs. */
  protected goOnFromTheirs(): void {
    const theirs = this.theirs();
    if (!theirs) return;
    this.machine.set(theirs);
    this.#basedOn.set(theirs);
    this.theirs.set(null);
  }

  async #explain(problem: ProblemError, mine: MachineDetails): Promise<void> {
    if (problem.status !== 409) return this.problem.set(problem);
    try {
      const newest = await firstValueFrom(this.#client.details(mine.id));
      if (this.#number(newest) <= this.#number(mine)) return this.problem.set(problem);
      this.theirs.set(newest);
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }
  #number(machine: MachineDetails | null): number {
    return machine?.macroRevision?.number ?? 0;
  }
  #forget(): void {
    this.#basedOn.set(null);
    this.theirs.set(null);
    this.problem.set(null);
    this.reason.set('');
  }
}

/** Line ends as a text area gives them back, so that an untouched text compares as untouched. */
function normal(text: string): string {
  return linesOf(text).join('\n');
}
