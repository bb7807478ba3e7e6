import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatSort, MatSortHeader } from '@angular/material/sort';
import type { Sort } from '@angular/material/sort';
import {
  MatCell,
  MatCellDef,
  MatColumnDef,
  MatHeaderCell,
  MatHeaderCellDef,
  MatHeaderRow,
  MatHeaderRowDef,
  MatRow,
  MatRowDef,
  MatTable,
} from '@angular/material/table';
import { RouterLink } from '@angular/router';
import type { CheckProgress, ProgramQuery, ProgramRecord } from '#contracts';
import { percentRead, withProgress } from '../bench/bench-lists';
import { countsInWords } from '../bench/counts-in-words';
import { formatBytes } from '../ui/count';
import { CountPipe } from '../ui/count-pipe';
import { MomentPipe } from '../ui/moment-pipe';
import { markOfCheck } from '../ui/severity-mark/mark-kind';
import { SeverityMark } from '../ui/severity-mark/severity-mark';

export type Sorting = Pick<ProgramQuery, 'sort' | 'direction'>;

/** One page of programs with the newest check of each on every machine. Sorting is asked for, not done. */
@Component({
  selector: 'nl-program-table',
  imports: [
    CountPipe,
    MatCell,
    MatCellDef,
    MatColumnDef,
    MatHeaderCell,
    MatHeaderCellDef,
    MatHeaderRow,
    MatHeaderRowDef,
    MatRow,
    MatRowDef,
    MatSort,
    MatSortHeader,
    MatTable,
    MomentPipe,
    RouterLink,
    SeverityMark,
  ],
  templateUrl: './program-table.html',
  styleUrl: './program-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramTable {
  readonly programs = input.required<readonly ProgramRecord[]>();
  readonly sort = input.required<Sorting['sort']>();
  readonly direction = input.required<Sorting['direction']>();
  readonly byCheck = input<ReadonlyMap<string, CheckProgress>>(new Map());
  readonly sorted = output<Sorting>();

  protected readonly columns = COLUMNS;
  protected readonly rows = computed(() =>
    this.programs().map((program) => ({
      ...program,
      size: formatBytes(program.bytes),
      checks: withProgress(program.checks, this.byCheck()).map((check) => ({
        id: check.id,
        mark: markOfCheck(check),
        note: [check.machineName, noteOf(check)].filter(Boolean).join(' · '),
      })),
    })),
  );

  protected resort({ active, direction }: Sort): void {
    const sort = SORTS.find((each) => each === active);
    if (sort && direction) this.sorted.emit({ sort, direction });
  }

  protected rowId(_index: number, row: { readonly id: string }): string {
    return row.id;
  }
}

const COLUMNS = ['name', 'verdict', 'lines', 'uploadedAt'] as const;
const SORTS: readonly Sorting['sort'][] = ['name', 'verdict', 'lines', 'uploadedAt'];

function noteOf(check: ProgramRecord['checks'][number]): string {
  if (check.state === 'running') return `${percentRead(check)} %`;
  if (check.outOfDate) return 'out of date';
  return countsInWords(check.counts);
}
