import { Location } from '@angular/common';
import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  afterRenderEffect,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatAnchor, MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { Severity } from '#engine';
import { toProblemError } from '../http/problem-error';
import { CheckStarter } from '../programs/check-starter';
import { CurrentUser } from '../sign-in/current-user';
import { counted, formatCount } from '../ui/count';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { RackStrip } from '../ui/rack-strip/rack-strip';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import { Shortcuts } from '../ui/shortcuts/shortcuts';
import { TablePlan } from '../ui/table-plan/table-plan';
import { VerdictBanner } from '../ui/verdict-banner/verdict-banner';
import { CheckReport } from './check-report';
import { FindingFilterBar } from './finding-filter/finding-filter';
import { FindingList } from './finding-list/finding-list';
import { LineReport } from './line-report/line-report';
import { markOnPlan } from './plan-mark';
import { marksOf } from './rack-marks';
import { factsOf, progressOf, verdictOf } from './report-head';
import { RunTimes } from './run-times/run-times';
import type { FindingFilter, RunMode } from './shown-finding';
import { EVERYTHING, countSeverities, filterFindings, showFindings } from './shown-finding';
import { ToolsUsed } from './tools-used/tools-used';
import { WhatItCovers } from './what-it-covers/what-it-covers';
import { wordChanges } from './word-report';
import { WorkZero } from './work-zero/work-zero';

/** The Check report: what one check says about one program on one machine, line by line. */
@Component({
  selector: 'nl-report-page',
  imports: [
    FindingFilterBar,
    FindingList,
    LineReport,
    MatAnchor,
    MatButton,
    MatProgressBar,
    Notice,
    PageHeader,
    RackStrip,
    RouterLink,
    RunTimes,
    SeverityMark,
    TablePlan,
    ToolsUsed,
    VerdictBanner,
    WhatItCovers,
    WorkZero,
  ],
  providers: [CheckReport],
  templateUrl: './report-page.html',
  styleUrl: './report-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportPage {
  readonly #location = inject(Location);
  readonly #router = inject(Router);
  readonly #snackBar = inject(MatSnackBar);
  readonly #starter = inject(CheckStarter);
  readonly #user = inject(CurrentUser);
  protected readonly report = inject(CheckReport);

  readonly id = input.required<string>();
  /** `?line=`: a line to show at once. */
  readonly line = input<string>();
  /** `?finding=`: a finding to show at once. */
  readonly finding = input<string>();

  private readonly lineReport = viewChild(LineReport);
  private readonly filterBar = viewChild(FindingFilterBar);
  private readonly lineField = viewChild<ElementRef<HTMLInputElement>>('lineField');

  protected readonly mode = signal<RunMode>('attended');
  protected readonly filter = signal<FindingFilter>(EVERYTHING);
  protected readonly current = signal<string | null>(null);
  protected readonly focusedTool = signal<number | null>(null);
  protected readonly starting = signal(false);
  #linkFollowed = '';

  protected readonly units = computed(() => this.#user.units());
  protected readonly mayCheck = computed(() => this.#user.may('ask-for-check'));
  protected readonly check = this.report.check;
  protected readonly setup = this.report.setup;
  protected readonly summary = computed(() => this.report.details()?.summary ?? null);
  protected readonly isDone = computed(() => this.check()?.state === 'done');
  protected readonly isWaiting = computed(() => {
    const state = this.check()?.state;
    return state === 'queued' || state === 'running';
  });

  readonly #shown = computed(() =>
    showFindings(this.report.findings() ?? [], this.mode(), this.units()),
  );
  protected readonly all = this.#shown;
  readonly #filtered = computed(() => filterFindings(this.#shown(), this.filter()));
  protected readonly wanted = computed(() => this.#filtered().wanted);
  protected readonly leftOut = computed(() => this.#filtered().leftOut);
  protected readonly severityCounts = computed(() => countSeverities(this.#shown()));
  protected readonly findingTools = computed(() =>
    [...new Set(this.#shown().flatMap(({ tool }) => (tool === null ? [] : [tool])))].sort(
      (a, b) => a - b,
    ),
  );
  readonly #currentFinding = computed(() => {
    const id = this.current();
    return this.#shown().find((each) => each.id === id) ?? null;
  });
  protected readonly position = computed(() => {
    const at = this.wanted().findIndex((each) => each.id === this.current());
    const count = this.wanted().length;
    return at < 0 ? counted(count, 'finding') : `${formatCount(at + 1)} of ${formatCount(count)}`;
  });

  protected readonly facts = computed(() => {
    const details = this.report.details();
    return details && factsOf(details, new Date());
  });
  protected readonly changes = computed(() => {
    const details = this.report.details();
    return details ? wordChanges(details, this.report.machineNow()) : [];
  });
  protected readonly isOutOfDate = computed(() => {
    const details = this.report.details();
    if (!details) return false;
    return details.check.outOfDate || details.newestRevision > details.check.programRevision;
  });
  protected readonly progress = computed(() => {
    const check = this.check();
    return check && progressOf(check);
  });
  protected readonly verdict = computed(() => {
    const summary = this.summary();
    return summary && verdictOf(summary, this.units());
  });
  protected readonly callOrder = computed(() =>
    [...(this.summary()?.tools ?? [])]
      .sort((a, b) => a.firstLine - b.firstLine)
      .map(({ number }) => number),
  );
  protected readonly marks = computed(() => marksOf(this.#shown()));
  protected readonly pocketPointedOut = computed(() => {
    const tool = this.focusedTool() ?? this.#currentFinding()?.tool ?? null;
    const loading = this.setup()?.loading.pockets;
    return tool === null ? null : (loading?.find((each) => each.tool === tool)?.pocket ?? null);
  });
  protected readonly planMark = computed(() => {
    const finding = this.#currentFinding();
    return finding ? markOnPlan(finding, this.units()) : null;
  });
  protected readonly texts = computed(() => {
    const setup = this.setup();
    if (!setup) return [];
    return [...(setup.changeMacro ? [setup.changeMacro] : []), ...setup.subprograms];
  });

  constructor() {
    const title = inject(Title);
    effect(() => {
      const id = this.id();
      untracked(() => this.report.open(id));
    });
    effect(() => {
      const name = this.check()?.programName;
      if (name) title.setTitle(`${name} · Check report · Nightlatch`);
    });
    afterRenderEffect(() => {
      if (this.lineReport() && this.report.findings()) untracked(() => this.#followLink());
    });
    this.#addKeys();
  }

  protected async checkAgain(): Promise<void> {
    const check = this.check();
    if (!check || this.starting()) return;
    this.starting.set(true);
    try {
      const begun = await firstValueFrom(
        this.#starter.start(check.programRevisionId, check.machineId),
      );
      await this.#router.navigate(['/checks', begun.id]);
    } catch (error) {
      const problem = toProblemError(error);
      this.#snackBar.open([problem.message, problem.next].filter(Boolean).join(' '), 'Close');
    } finally {
      this.starting.set(false);
    }
  }

  protected readAgain(): void {
    this.report.open(this.id());
  }
  protected step(by: 1 | -1): void {
    this.lineReport()?.step(by);
  }
  protected first(): void {
    this.lineReport()?.first();
  }
  protected foldAll(): void {
    this.lineReport()?.foldAll();
  }
  protected goToTyped(text: string): void {
    const line = Number(text.replace(/\s/g, ''));
    if (Number.isFinite(line) && line >= 1) this.showLine(line);
  }
  protected showLine(line: number): void {
    this.lineReport()?.showLine(line);
  }
  protected showFinding(id: string): void {
    this.lineReport()?.showFinding(id);
  }
  /** The address follows what is read, so that it can be sent to somebody as it stands. */
  protected keepCurrent(id: string | null): void {
    this.current.set(id);
    if (id !== null) this.#location.replaceState(`/checks/${this.id()}`, `finding=${id}`);
  }
  protected keepLine(line: number): void {
    this.#location.replaceState(`/checks/${this.id()}`, `line=${line}`);
  }
  protected focusPocket(pocket: number | null): void {
    this.focusedTool.set(this.#toolIn(pocket));
  }
  protected showToolOf(pocket: number): void {
    const tool = this.#toolIn(pocket);
    const use = this.summary()?.tools.find((each) => each.number === tool);
    if (use) this.showLine(use.firstLine);
    else this.#snackBar.open(tool === null ? 'This pocket is empty.' : `T${tool} is not called.`);
  }

  #toolIn(pocket: number | null): number | null {
    const loading = this.setup()?.loading.pockets;
    return loading?.find((each) => each.pocket === pocket)?.tool ?? null;
  }

  #followLink(): void {
    const link = `${this.id()} ${this.finding() ?? ''} ${this.line() ?? ''}`;
    if (this.#linkFollowed === link) return;
    this.#linkFollowed = link;
    const finding = this.finding();
    const line = Number(this.line());
    if (finding !== undefined) {
      if (this.#shown().some((each) => each.id === finding)) this.showFinding(finding);
      else this.#snackBar.open('The finding of this link is not in this check.', 'Close');
    } else if (line >= 1) this.showLine(line);
  }

  #addKeys(): void {
    const place = 'Check report';
    const toggle = (severity: Severity) => () => this.filterBar()?.toggle(severity);
    inject(Shortcuts).add(
      { keys: 'n', does: 'Next finding', place, run: () => this.step(1) },
      { keys: 'p', does: 'Previous finding', place, run: () => this.step(-1) },
      { keys: 'f', does: 'First finding', place, run: () => this.first() },
      { keys: 'g l', does: 'Go to a line', place, run: () => this.#focusLineField() },
      {
        keys: 'u',
        does: 'Unfold the next stretch',
        place,
        run: () => this.lineReport()?.unfoldNext(),
      },
      { keys: 'z', does: 'Fold everything again', place, run: () => this.foldAll() },
      { keys: 's', does: 'Show or hide stops', place, run: toggle('stop') },
      { keys: 'h', does: 'Show or hide holds', place, run: toggle('hold') },
      { keys: 'o', does: 'Show or hide notes', place, run: toggle('note') },
      {
        keys: 'a',
        does: 'Read for an attended or an unattended run',
        place,
        run: () => this.mode.update((mode) => (mode === 'attended' ? 'unattended' : 'attended')),
      },
    );
  }

  #focusLineField(): void {
    const field = this.lineField()?.nativeElement;
    field?.focus();
    field?.select();
  }
}
