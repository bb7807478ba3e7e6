import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatAnchor, MatButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatOption, MatSelect } from '@angular/material/select';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router, RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import {
  EMPTY,
  auditTime,
  catchError,
  combineLatest,
  filter,
  firstValueFrom,
  merge,
  switchMap,
  tap,
  timer,
} from 'rxjs';
import type { CheckProgress, CheckRecord, ProgramDetails } from '#contracts';
import { withProgress } from '../bench/bench-lists';
import { CheckRow } from '../bench/check-row';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { ShopEvents } from '../http/shop-events';
import { CurrentUser } from '../sign-in/current-user';
import { counted, formatBytes } from '../ui/count';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { CheckStarter } from './check-starter';
import { JobForm } from './job-form';
import type { JobDocument } from './job-sheet';
import { MachineChoices } from './machine-choices';
import { ProgramRack } from './program-rack';
import { ProgramReader } from './program-reader';
import { RevisionTable } from './revision-table';

/** News in a burst is read once (ms); without a stream the page is read again this often (ms). */
const GATHER = 400;
const POLL = 5_000;

/** One program: its revisions, its checks on each machine, and its job sheet. */
@Component({
  selector: 'nl-program-page',
  imports: [
    CheckRow,
    JobForm,
    MatAnchor,
    MatButton,
    MatFormField,
    MatIcon,
    MatLabel,
    MatOption,
    MatSelect,
    Notice,
    PageHeader,
    ProgramRack,
    RevisionTable,
    RouterLink,
  ],
  templateUrl: './program-page.html',
  styleUrl: './program-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramPage implements HoldsUnsaved {
  readonly #events = inject(ShopEvents);
  readonly #reader = inject(ProgramReader);
  readonly #router = inject(Router);
  readonly #snackBar = inject(MatSnackBar);
  readonly #starter = inject(CheckStarter);
  readonly #user = inject(CurrentUser);
  protected readonly choices = inject(MachineChoices);

  /** The program's id, from the address. */
  readonly id = input.required<string>();

  private readonly jobForm = viewChild(JobForm);
  readonly #again = signal(0);

  protected readonly details = signal<ProgramDetails | null>(null);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly starting = signal<ReadonlySet<string>>(new Set());
  protected readonly savingJob = signal(false);
  protected readonly jobProblem = signal<ProblemError | null>(null);
  /** The sheet a person tried to save over a newer one, kept for a second try. */
  protected readonly mine = signal<JobDocument | null>(null);
  protected readonly mayCheck = computed(() => this.#user.may('ask-for-check'));

  protected readonly program = computed(() => this.details()?.program ?? null);
  protected readonly facts = computed(() => {
    const program = this.program();
    if (!program) return '';
    return [
      counted(program.lines, 'line'),
      formatBytes(program.bytes),
      `sent in by ${program.uploadedBy ?? 'Nightlatch'}`,
    ].join(' · ');
  });
  protected readonly shortHash = computed(() => {
    const sha256 = this.program()?.sha256;
    return sha256 ? `${sha256.slice(0, 4)}…${sha256.slice(-4)}` : '';
  });
  protected readonly textAddress = computed(
    () => `/api/v1/program-revisions/${this.program()?.revisionId}/text`,
  );
  protected readonly checks = computed(() =>
    withProgress(this.program()?.checks ?? [], this.#events.byCheck()),
  );
  /** The finished check whose rack is drawn: the newest of the newest revision. */
  protected readonly rackCheck = computed(
    () =>
      this.checks()
        .filter((check) => check.state === 'done')
        .toSorted((one, other) => (other.finishedAt ?? '').localeCompare(one.finishedAt ?? ''))[0],
  );
  /** Machines the newest revision was not held against yet. */
  protected readonly otherMachines = computed(() => {
    const checked = new Set(this.checks().map((check) => check.machineId));
    return (this.choices.machines() ?? []).filter((machine) => !checked.has(machine.id));
  });

  constructor() {
    void this.choices.read();
    combineLatest([toObservable(this.id), toObservable(this.#again)])
      .pipe(
        switchMap(([id]) => this.#read(id)),
        takeUntilDestroyed(),
      )
      .subscribe();
    const ended = this.#events.progress$.pipe(filter((progress) => this.#isNews(progress)));
    const polls = timer(POLL, POLL).pipe(filter(() => !this.#events.live()));
    merge(ended, polls)
      .pipe(auditTime(GATHER), takeUntilDestroyed())
      .subscribe(() => this.readAgain());
  }

  /** Whether leaving now would lose a typed job sheet (unsaved-guard.ts). */
  hasUnsaved(): boolean {
    return this.jobForm()?.touched() ?? false;
  }

  protected readAgain(): void {
    this.#again.update((count) => count + 1);
  }

  protected async startCheck(machineId: string): Promise<void> {
    const program = this.program();
    if (!program) return;
    this.starting.update((ids) => new Set([...ids, machineId]));
    try {
      const check = await firstValueFrom(this.#starter.start(program.revisionId, machineId));
      this.readAgain();
      const said = this.#snackBar.open(`Checking against ${check.machineName}.`, 'See it');
      said.onAction().subscribe(() => void this.#router.navigate(['/checks', check.id]));
    } catch (error) {
      this.#snackBar.open(toProblemError(error).message, 'Close');
    } finally {
      this.starting.update((ids) => new Set([...ids].filter((id) => id !== machineId)));
    }
  }

  protected async saveJob(job: JobDocument): Promise<void> {
    this.savingJob.set(true);
    this.jobProblem.set(null);
    const basedOn = this.details()?.jobRevision ?? 0;
    try {
      const details = await firstValueFrom(this.#reader.saveJob(this.id(), job, basedOn));
      this.jobForm()?.settle();
      this.details.set(details);
      this.mine.set(null);
      this.#snackBar.open(`Saved as job sheet ${details.jobRevision}.`);
    } catch (error) {
      const problem = toProblemError(error);
      this.jobProblem.set(problem);
      this.mine.set(problem.status === 409 ? job : null);
    } finally {
      this.savingJob.set(false);
    }
  }

  /** Saves what was typed on top of the sheet that came between, which stays in the history. */
  protected async saveOverTheirs(): Promise<void> {
    const job = this.mine();
    if (!job) return;
    try {
      const { jobRevision } = await firstValueFrom(this.#reader.details(this.id()));
      this.details.update((details) => details && { ...details, jobRevision });
      await this.saveJob(job);
    } catch (error) {
      this.jobProblem.set(toProblemError(error));
    }
  }

  protected takeTheirs(): void {
    this.jobForm()?.settle();
    this.mine.set(null);
    this.jobProblem.set(null);
    this.readAgain();
  }

  protected canCheckAgain(check: CheckRecord): boolean {
    return this.mayCheck() && (check.state === 'done' || check.state === 'failed');
  }

  #isNews(progress: CheckProgress): boolean {
    if (progress.state === 'running') return false;
    return this.checks().some((check) => check.id === progress.checkId);
  }

  #read(id: string): Observable<ProgramDetails> {
    return this.#reader.details(id).pipe(
      tap((details) => {
        this.#keepTyped(details);
        this.problem.set(null);
      }),
      catchError((error: unknown) => {
        this.problem.set(toProblemError(error));
        return EMPTY;
      }),
    );
  }

  /** News of a check must not sweep away a sheet that is being typed. */
  #keepTyped(fresh: ProgramDetails): void {
    this.details.update((known) =>
      known && this.jobForm()?.touched()
        ? { ...fresh, job: known.job, jobRevision: known.jobRevision }
        : { ...fresh, job: sameJob(known, fresh) ? (known?.job ?? null) : fresh.job },
    );
  }
}

/** The same revision is the same sheet: keeping the object keeps the form as it stands. */
function sameJob(known: ProgramDetails | null, fresh: ProgramDetails): boolean {
  return known?.program.id === fresh.program.id && known.jobRevision === fresh.jobRevision;
}
