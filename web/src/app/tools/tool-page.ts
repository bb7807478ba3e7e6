import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom, map } from 'rxjs';
import type { ToolRecord } from '#contracts';
import { toolSchema } from '#contracts';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { wordFigure } from '../ui/facts/measure';
import type { FactChange, Keeping, Standing } from '../ui/facts/revised-facts';
import { RevisedFacts } from '../ui/facts/revised-facts';
import { SectionExtra } from '../ui/facts/section-extra';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { RevisionList } from '../ui/revision-list/revision-list';
import type { HoldsUnsaved } from '../ui/unsaved/unsaved-guard';
import { sumHolder } from './holder-sum';
import { MeasureDialog } from './measure-dialog';
import { ToolClient } from './tool-client';
import { ToolDrawing } from './tool-drawing';
import { TABLE_SECTIONS, TOOL_SECTIONS } from './tool-fields';
import { NEW_TOOL, factsOf, toolPartOf, validateFacts } from './tool-facts';

/** One tool: its drawing, every fact of it, its measured length and its history; or a new one. */
@Component({
  selector: 'nl-tool-page',
  imports: [
    MatButton,
    Notice,
    PageHeader,
    RevisedFacts,
    RevisionList,
    RouterLink,
    SectionExtra,
    ToolDrawing,
  ],
  templateUrl: './tool-page.html',
  styleUrl: './tool-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolPage implements HoldsUnsaved {
  readonly #client = inject(ToolClient);
  readonly #dialog = inject(MatDialog);
  readonly #router = inject(Router);
  readonly #snackBar = inject(MatSnackBar);
  readonly #user = inject(CurrentUser);

  /** Absent on the page for a new tool. */
  readonly toolId = input<string>();

  private readonly facts = viewChild(RevisedFacts);

  protected readonly list = rxResource({ stream: () => this.#client.list() });
  readonly #listed = computed<ToolRecord | null>(() => {
    const records = this.list.hasValue() ? this.list.value() : [];
    return records.find((each) => each.id === this.toolId()) ?? null;
  });
  /** The tool as last fetched or saved. */
  protected readonly record = linkedSignal(() => this.#listed());
  protected readonly past = rxResource({
    params: () => {
      const record = this.record();
      return record ? { id: record.id, number: record.revision.number } : undefined;
    },
    stream: ({ params }) => this.#client.revisions(params.id),
  });

  protected readonly sections = [...TOOL_SECTIONS, ...TABLE_SECTIONS];
  protected readonly units = this.#user.units;
  protected readonly isNew = computed(() => this.toolId() === undefined);
  protected readonly mayChange = computed(() => this.#user.may('change-tools'));
  protected readonly mayMeasure = computed(() => this.#user.may('record-length'));
  protected readonly problem = computed(() => {
    const error = this.list.error();
    return error ? toProblemError(error) : null;
  });
  protected readonly revisions = computed(() => (this.past.hasValue() ? this.past.value() : []));
  protected readonly standing = computed<Standing | null>(() => {
    const record = this.record();
    if (record) return { value: factsOf(record), revision: record.revision };
    return this.isNew() ? { value: NEW_TOOL, revision: null } : null;
  });
  protected readonly heading = computed(() => {
    const tool = this.record()?.tool;
    return tool ? `T${tool.number} ${tool.name}` : 'A new tool';
  });
  protected readonly said = signal<Readonly<Record<string, unknown>> | null>(null);
  /** The tool as typed at this moment, once enough of it is there to be drawn. */
  protected readonly drawn = computed(() => {
    const facts = this.said();
    const typed = facts ? toolSchema.safeParse(toolPartOf(facts)) : undefined;
    return typed?.success ? typed.data : (this.record()?.tool ?? null);
  });

  protected readonly keeping: Keeping = {
    validate: validateFacts,
    keep: (change) => this.#keep(change),
    fetch: () =>
      this.#client.list().pipe(
        map((records) => {
          const record = records.find((each) => each.id === this.toolId());
          if (record) this.record.set(record);
          return this.standing() ?? { value: NEW_TOOL, revision: null };
        }),
      ),
  };

  hasUnsaved(): boolean {
    return this.facts()?.hasUnsaved() ?? false;
  }

  protected holderSum(value: unknown): { words: string; agrees: boolean } | null {
    const sum = sumHolder(value);
    if (!sum) return null;
    const length = (mm: number) => wordFigure(mm, 'length', this.units());
    const between = `between gauge line and holder face ${length(sum.wanted)}`;
    if (sum.steps === 0) {
      return { words: `No steps given; ${between} is one cylinder.`, agrees: sum.agrees };
    }
    const verdict = sum.agrees
      ? 'They agree.'
      : 'They may differ by 0.5 mm at most: correct a step, the stick-out or the gauge length.';
    return {
      words: `The steps add up to ${length(sum.steps)}; ${between}. ${verdict}`,
      agrees: sum.agrees,
    };
  }

  protected async kept(): Promise<void> {
    const record = this.record();
    if (!record) return;
    this.#snackBar.open(`Saved as revision ${record.revision.number} of T${record.tool.number}.`);
    if (this.isNew()) await this.#router.navigate(['/tools', record.id], { replaceUrl: true });
  }

  protected async measure(): Promise<void> {
    const data = this.record();
    if (!data) return;
    const dialog = this.#dialog.open<MeasureDialog, ToolRecord, ToolRecord>(MeasureDialog, {
      data,
      maxWidth: '34rem',
    });
    const saved = await firstValueFrom(dialog.afterClosed());
    if (!saved) return;
    this.record.set(saved);
    this.#snackBar.open(
      `Recorded ${wordFigure(saved.tool.gaugeLength, 'length', this.units())} for T${saved.tool.number}.`,
    );
  }

  #keep({ value, basedOn, reason }: FactChange) {
    const parts = validateFacts(value);
    // RevisedFacts only keeps what was validated; a miss here is our bug.
    if (!parts.success) throw new Error('Unvalidated tool');
    const id = this.toolId();
    const body = { ...parts.data, reason };
    const saved = id ? this.#client.save(id, { ...body, basedOn }) : this.#client.add(body);
    return saved.pipe(
      map((record) => {
        this.record.set(record);
        return { value: factsOf(record), revision: record.revision };
      }),
    );
  }
}
