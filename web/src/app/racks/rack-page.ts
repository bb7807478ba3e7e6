import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { toProblemError } from '../http/problem-error';
import { LastMachine } from '../machines/last-machine';
import { MachineClient } from '../machines/machine-client';
import { CurrentUser } from '../sign-in/current-user';
import { ToolClient } from '../tools/tool-client';
import { ConflictNotice } from '../ui/conflict-notice/conflict-notice';
import { IntoView } from '../ui/into-view/into-view';
import { MachineTabs } from '../ui/machine-tabs/machine-tabs';
import { MomentPipe } from '../ui/moment-pipe';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { RackStrip } from '../ui/rack-strip/rack-strip';
import { SaveBar } from '../ui/save-bar/save-bar';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { LoadingDraft } from './loading-draft';
import { LoadingHistory } from './loading-history';
import type { PastLoading } from './loading-history';
import { wordSpindle, wordTool } from './loading-words';
import type { PocketChoice } from './pocket-chooser';
import { PocketChooser } from './pocket-chooser';
import { offerPockets } from './pocket-offers';
import { layOutPockets, marksOf } from './pocket-rows';
import type { ToolChoice } from './tool-chooser';
import { ToolChooser } from './tool-chooser';
import { offerTools } from './tool-offers';

/** What sits in which pocket, and saying so when it changes. */
@Component({
  selector: 'nl-rack-page',
  imports: [
    ConflictNotice,
    IntoView,
    LoadingHistory,
    MachineTabs,
    MatButton,
    MatFormField,
    MatLabel,
    MatOption,
    MatSelect,
    MomentPipe,
    Notice,
    PageHeader,
    RackStrip,
    RouterLink,
    SaveBar,
    SeverityMark,
  ],
  providers: [LoadingDraft],
  templateUrl: './rack-page.html',
  styleUrl: './rack-page.scss',
  host: { '(window:beforeunload)': 'holdUnload($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackPage implements HoldsUnsaved {
  readonly #dialog = inject(MatDialog);
  readonly #last = inject(LastMachine);
  readonly #machines = inject(MachineClient);
  readonly #snackBar = inject(MatSnackBar);
  readonly #tools = inject(ToolClient);
  readonly #user = inject(CurrentUser);
  protected readonly draft = inject(LoadingDraft);

  readonly machineId = input.required<string>();

  protected readonly list = rxResource({ stream: () => this.#machines.list() });
  protected readonly details = rxResource({
    params: () => this.machineId(),
    stream: ({ params }) => this.#machines.details(params),
  });
  protected readonly toolList = rxResource({ stream: () => this.#tools.list() });
  protected readonly pointedOut = signal<number | null>(null);

  protected readonly units = this.#user.units;
  protected readonly mayLoad = computed(() => this.#user.may('change-loading'));
  protected readonly mayTellSpindle = computed(() => this.#user.may('say-spindle-holds'));
  protected readonly machines = computed(() => (this.list.hasValue() ? this.list.value() : []));
  protected readonly records = computed(() =>
    this.toolList.hasValue() ? this.toolList.value() : [],
  );
  protected readonly drawnTools = computed(() => this.records().map((each) => each.tool));
  protected readonly toolByNumber = computed(
    () => new Map(this.drawnTools().map((tool) => [tool.number, tool])),
  );
  protected readonly problem = computed(() => {
    const error = this.details.error() ?? this.toolList.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly rows = computed(() => {
    const machine = this.draft.machine();
    const loading = this.draft.loading();
    if (!machine || !loading) return [];
    return layOutPockets({
      rack: machine.rack,
      loading,
      saved: machine.loading,
      tools: this.toolByNumber(),
      units: this.units(),
    });
  });
  protected readonly marks = computed(() => marksOf(this.rows()));
  protected readonly spindleOffers = computed(() => {
    const loading = this.draft.loading();
    if (!loading) return [];
    const numbers = [...loading.pockets.map((each) => each.tool), ...loading.byHand];
    const held = typeof loading.inSpindle === 'number' ? [loading.inSpindle] : [];
    return [...new Set([...numbers, ...held])]
      .sort((one, other) => one - other)
      .map((number) => ({ number, words: wordTool(number, this.toolByNumber()) }));
  });
  /** A select shows no value for null, so nothing held has a word of its own. */
  protected readonly spindleValue = computed(() => this.draft.loading()?.inSpindle ?? 'nothing');
  protected readonly spindleWords = computed(() => {
    const loading = this.draft.loading();
    return loading ? wordSpindle(loading.inSpindle) : '';
  });
  protected readonly handTools = computed(() =>
    (this.draft.loading()?.byHand ?? []).map((number) => ({
      number,
      words: wordTool(number, this.toolByNumber()),
    })),
  );
  protected readonly act = computed(
    () => `Save as loading ${(this.draft.machine()?.loadingRevision.number ?? 0) + 1}`,
  );

  constructor() {
    effect(() => {
      if (!this.details.hasValue()) return;
      const machine = this.details.value();
      // Only a new answer opens the draft; what the draft itself keeps must not.
      untracked(() => this.draft.open(machine));
      this.#last.remember(machine.id);
    });
    effect(() => this.draft.know(this.toolByNumber()));
  }

  hasUnsaved(): boolean {
    return this.draft.edits().length > 0;
  }
  protected holdUnload(event: BeforeUnloadEvent): void {
    if (this.hasUnsaved()) event.preventDefault();
  }
  protected fetchAgain(): void {
    this.details.reload();
    this.toolList.reload();
  }

  protected async load(pocketNumber: number): Promise<void> {
    const machine = this.draft.machine();
    const loading = this.draft.loading();
    const pocket = machine?.rack.pockets.find((each) => each.number === pocketNumber);
    if (!machine || !loading || !pocket || !this.mayLoad()) return;
    const offers = offerTools({
      records: this.records(),
      loading,
      rack: machine.rack,
      machineId: machine.id,
      pocket,
      units: this.units(),
    });
    const tool = await this.#askTool({ heading: `Load pocket ${pocketNumber}`, offers });
    if (tool !== undefined) this.draft.add({ act: 'load', tool, pocket: pocketNumber });
  }
  protected async move(from: number, tool: number): Promise<void> {
    const machine = this.draft.machine();
    const loading = this.draft.loading();
    if (!machine || !loading) return;
    const offers = offerPockets({
      from,
      tool,
      rack: machine.rack,
      loading,
      tools: this.toolByNumber(),
      units: this.units(),
    });
    const data: PocketChoice = { heading: `Move T${tool} to which pocket?`, offers };
    const dialog = this.#dialog.open<PocketChooser, PocketChoice, number>(PocketChooser, { data });
    const to = await firstValueFrom(dialog.afterClosed());
    if (typeof to === 'number') this.draft.add({ act: 'swap', pocket: from, with: to });
  }
  protected unload(pocket: number): void {
    this.draft.add({ act: 'unload', pocket });
  }
  protected tellSpindle(value: number | 'unknown' | 'nothing'): void {
    const holds = value === 'nothing' ? null : value;
    this.draft.add({ act: 'spindle', holds });
  }
  protected async addByHand(): Promise<void> {
    const machine = this.draft.machine();
    const loading = this.draft.loading();
    if (!machine || !loading) return;
    const offers = offerTools({
      records: this.records(),
      loading,
      rack: machine.rack,
      machineId: machine.id,
      pocket: null,
      units: this.units(),
    });
    const tool = await this.#askTool({ heading: 'Which tool is fitted by hand?', offers });
    if (tool !== undefined) this.draft.add({ act: 'by-hand', tool, fitted: true });
  }
  protected takeOffHandList(tool: number): void {
    this.draft.add({ act: 'by-hand', tool, fitted: false });
  }
  protected goBack({ number, loading }: PastLoading): void {
    const standing = new Set(this.draft.machine()?.rack.pockets.map((each) => each.number));
    const pockets = loading.pockets.filter((each) => standing.has(each.pocket));
    this.draft.add({ act: 'go-back', revision: number, to: { ...loading, pockets } });
    const left = loading.pockets.length - pockets.length;
    if (left > 0) {
      const words = `${left} of its pockets are no longer in the rack and were left out.`;
      this.#snackBar.open(words, 'Close');
    }
  }
  protected async save(): Promise<void> {
    const number = await this.draft.save();
    if (number === null) return;
    this.list.reload();
    this.toolList.reload();
    this.#snackBar.open(
      `Saved as loading ${number}. Programs checked on this machine are checked again.`,
      'Close',
    );
  }

  async #askTool(data: ToolChoice): Promise<number | undefined> {
    const finePointer = globalThis.matchMedia?.('(pointer: fine)').matches ?? true;
    const dialog = this.#dialog.open<ToolChooser, ToolChoice, number>(ToolChooser, {
      data,
      maxWidth: '96vw',
      // On a tablet the search must not call up the keyboard over the list.
      autoFocus: finePointer ? 'input' : 'dialog',
    });
    const tool = await firstValueFrom(dialog.afterClosed());
    return typeof tool === 'number' ? tool : undefined;
  }
}
