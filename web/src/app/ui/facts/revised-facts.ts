import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  contentChildren,
  effect,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import type { Observable } from 'rxjs';
import { firstValueFrom, map, of, startWith, switchMap } from 'rxjs';
import type { z } from 'zod';
import type { Revision, Units } from '#contracts';
import type { ProblemError } from '../../http/problem-error';
import { toProblemError } from '../../http/problem-error';
import { ConflictNotice } from '../conflict-notice/conflict-notice';
import { IntoView } from '../into-view/into-view';
import { Notice } from '../notice/notice';
import { SaveBar } from '../save-bar/save-bar';
import { differencesOf, isSame, rebase } from './differences';
import { wordDifference } from './difference-words';
import { FactEditor } from './fact-editor';
import type { FactSection } from './fact-field';
import { fieldsOf } from './fact-field';
import type { FactForm } from './fact-form';
import { childOf, openFactForm, readFactForm } from './fact-form';
import type { FactNode } from './fact-node';
import { FactReading } from './fact-reading';
import { SectionExtra } from './section-extra';
import { WrongSummary } from './wrong-summary';
import type { MarkedFact } from './wrong-facts';
import { joinWrong, markWrong, wordIssues, wordProblemFields } from './wrong-facts';

type Facts = Readonly<Record<string, unknown>>;
/** Facts as they stand now, at a revision; null before the first. */
export interface Standing {
  readonly value: Facts;
  readonly revision: Revision | null;
}
export interface FactChange {
  readonly value: Facts;
  readonly basedOn: number;
  readonly reason: string;
}
/** What a contract says of typed facts: the facts as it reads them, or everything it refuses. */
export type Held<T = unknown> =
  | { readonly success: true; readonly data: T }
  | { readonly success: false; readonly error: { readonly issues: readonly z.core.$ZodIssue[] } };
/** How a page's facts are held against the contract, kept and fetched again. */
export interface Keeping {
  readonly validate: (value: Facts) => Held;
  readonly keep: (change: FactChange) => Observable<Standing>;
  readonly fetch: () => Observable<Standing>;
}

/**
 * Facts that are read, and changed by those who may, as one revision with a reason. Wrong entries are
 * marked by the contract before anything is sent; when another person saved first, theirs is shown
 * and one's own changes stay.
 */
@Component({
  selector: 'nl-revised-facts',
  imports: [
    ConflictNotice,
    FactEditor,
    FactReading,
    IntoView,
    MatButton,
    NgTemplateOutlet,
    Notice,
    SaveBar,
    WrongSummary,
  ],
  templateUrl: './revised-facts.html',
  styleUrl: './revised-facts.scss',
  host: { '(window:beforeunload)': 'holdUnload($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisedFacts {
  readonly sections = input.required<readonly FactSection[]>();
  readonly standing = input.required<Standing>();
  readonly keeping = input.required<Keeping>();
  readonly units = input.required<Units>();
  /** What a revision is of: "description", "rack", "tool". */
  readonly subject = input.required<string>();
  readonly mayChange = input(false);
  /** Something new: opens as a form, and there is nothing to read yet. */
  readonly isNew = input(false);
  readonly kept = output<Standing>();
  /** What the facts say at this moment, with every change; for a drawing beside the form. */
  readonly said = output<Facts>();

  private readonly extras = contentChildren(SectionExtra);

  /** The form while someone changes the facts; null while they are only read. */
  protected readonly form = linkedSignal<boolean, FactForm | null>({
    source: this.isNew,
    computation: (isNew) => (isNew ? this.#open(this.standing().value) : null),
  });
  /** What the changes are based on; moves on to another's revision only when the person says so. */
  readonly #changesOn = signal<Standing | null>(null);
  readonly #base = computed(() => this.#changesOn() ?? this.standing());
  readonly #theirs = signal<Standing | null>(null);
  protected readonly reason = signal('');
  protected readonly saving = signal(false);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly wrong = signal<readonly MarkedFact[]>([]);
  protected readonly clashes = signal<readonly string[]>([]);

  readonly #typed = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) => (form ? form.control.valueChanges.pipe(startWith(null)) : of(null))),
      map(() => ({})),
    ),
  );
  /** What the facts are at this moment: as typed while they are changed, else as they stand. */
  protected readonly live = computed<Facts>(() => {
    this.#typed();
    const form = this.form();
    return form ? readFactForm(form).value : this.standing().value;
  });
  protected readonly act = computed(() => {
    const next = (this.#base().revision?.number ?? 0) + 1;
    return this.isNew() ? `Add the ${this.subject()}` : `Save as ${this.subject()} ${next}`;
  });
  protected readonly conflict = computed(() => {
    const theirs = this.#theirs();
    const form = this.form();
    if (!theirs?.revision || !form) return null;
    const base = this.#base().value;
    const fields = this.#fields();
    const word = (each: Parameters<typeof wordDifference>[0]) =>
      wordDifference(each, fields, this.units());
    const { clashes } = rebase(base, readFactForm(form).value, theirs.value);
    return {
      revision: theirs.revision,
      changes: differencesOf(base, theirs.value).map(word),
      clashes: clashes.map(({ path, theirs: is }) => word({ path, was: undefined, is })),
    };
  });
  readonly #fields = computed(() => fieldsOf(this.sections()));

  constructor() {
    effect(() => this.said.emit(this.live()));
  }

  /** Whether leaving now would lose something typed. */
  hasUnsaved(): boolean {
    return this.form()?.control.dirty ?? false;
  }
  protected holdUnload(event: BeforeUnloadEvent): void {
    if (this.hasUnsaved()) event.preventDefault();
  }
  protected nodesOf(form: FactForm, section: FactSection): readonly FactNode[] {
    const group = section.under ? childOf(form.root, section.under.key) : form.root;
    if (group.kind !== 'group') return [];
    return section.fields.map((field) => childOf(group, field.key));
  }
  protected partOf(section: FactSection): unknown {
    const { value } = this.standing();
    return section.under ? value[section.under.key] : value;
  }
  protected extraOf(section: FactSection): SectionExtra | undefined {
    return this.extras().find((extra) => extra.nlSectionExtra() === section.title);
  }

  /** Opens the form; a page may call it, to start with something other than what stands. */
  change(value: Facts = this.standing().value): void {
    this.#forget();
    // What stands may move on while the form is open; the changes stay based on what was read.
    this.#changesOn.set(this.standing());
    this.form.set(this.#open(value));
  }
  protected drop(): void {
    this.#forget();
    this.form.set(this.isNew() ? this.#open(this.standing().value) : null);
  }

  protected async save(): Promise<void> {
    const form = this.form();
    if (!form) return;
    const { value, wrong } = readFactForm(form);
    const result = this.keeping().validate(value);
    const refused = result.success ? [] : wordIssues(result.error.issues);
    this.wrong.set(markWrong(form, joinWrong(wrong, refused)));
    this.problem.set(null);
    if (this.wrong().length > 0) return;
    // A revision that changes nothing would only push the last real one down the list.
    if (!this.isNew() && isSame(value, this.#base().value)) return this.drop();
    await this.#send(form, value);
  }

  async #send(form: FactForm, value: Facts): Promise<void> {
    this.saving.set(true);
    const basedOn = this.#base().revision?.number ?? 0;
    try {
      const change = { value, basedOn, reason: this.reason() };
      const standing = await firstValueFrom(this.keeping().keep(change));
      form.control.markAsPristine();
      this.#forget();
      this.form.set(null);
      this.kept.emit(standing);
    } catch (error) {
      await this.#explain(toProblemError(error), form);
    } finally {
      this.saving.set(false);
    }
  }

  /** Theirs with mine on top, in a new form; saved only after the person has looked. */
  protected goOnFromTheirs(): void {
    const form = this.form();
    const theirs = this.#theirs();
    if (!form || !theirs) return;
    const { value } = rebase(this.#base().value, readFactForm(form).value, theirs.value);
    this.clashes.set(this.conflict()?.clashes ?? []);
    this.#changesOn.set(theirs);
    this.#theirs.set(null);
    this.wrong.set([]);
    const next = this.#open(isFacts(value) ? value : theirs.value);
    next.control.markAsDirty();
    this.form.set(next);
  }

  async #explain(problem: ProblemError, form: FactForm): Promise<void> {
    const fields = problem.problem.fields ?? [];
    if (fields.length > 0) this.wrong.set(markWrong(form, wordProblemFields(form, fields)));
    if (problem.status !== 409) return this.problem.set(problem);
    try {
      const theirs = await firstValueFrom(this.keeping().fetch());
      const isNewer = (this.#base().revision?.number ?? 0) < (theirs.revision?.number ?? 0);
      if (isNewer) this.#theirs.set(theirs);
      else this.problem.set(problem);
    } catch (error) {
      this.problem.set(toProblemError(error));
    }
  }

  #open(value: Facts): FactForm {
    return openFactForm(this.#fields(), value, this.units());
  }
  #forget(): void {
    this.reason.set('');
    this.problem.set(null);
    this.wrong.set([]);
    this.clashes.set([]);
    this.#theirs.set(null);
    this.#changesOn.set(null);
  }
}

function isFacts(value: unknown): value is Facts {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
