import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import type { Sort } from '@angular/material/sort';
import { MatSort, MatSortHeader } from '@angular/material/sort';
import { RouterLink } from '@angular/router';
import { toProblemError } from '../http/problem-error';
import { CurrentUser } from '../sign-in/current-user';
import { counted } from '../ui/count';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { SeverityMark } from '../ui/severity-mark/severity-mark';
import { ToolClient } from './tool-client';
import type { ToolQuery } from './tool-table';
import { TOOL_COLUMNS, queryTools, rowOfTool } from './tool-table';

/** Every tool of the shop: what it is, how long, when measured, how much life is left, where it sits. */
@Component({
  selector: 'nl-tools-page',
  imports: [
    FormsModule,
    MatButton,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MatSort,
    MatSortHeader,
    Notice,
    PageHeader,
    RouterLink,
    SeverityMark,
  ],
  templateUrl: './tools-page.html',
  styleUrl: './tools-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolsPage {
  readonly #client = inject(ToolClient);
  readonly #user = inject(CurrentUser);

  protected readonly list = rxResource({ stream: () => this.#client.list() });
  protected readonly query = signal<ToolQuery>({
    search: '',
    kind: '',
    where: '',
    sortBy: 'number',
    direction: 'asc',
  });

  protected readonly mayAdd = computed(() => this.#user.may('change-tools'));
  protected readonly records = computed(() => (this.list.hasValue() ? this.list.value() : []));
  protected readonly kinds = computed(() =>
    [...new Set(this.records().map(({ tool }) => tool.kind))].sort(),
  );
  protected readonly rows = computed(() => {
    const now = new Date();
    const units = this.#user.units();
    return queryTools(this.records(), this.query()).map((each) => rowOfTool(each, units, now));
  });
  protected readonly count = computed(() => {
    const all = counted(this.records().length, 'tool');
    const shown = this.rows().length;
    return shown === this.records().length ? all : `${shown} of ${all}`;
  });
  protected readonly problem = computed(() => {
    const error = this.list.error();
    return error ? toProblemError(error) : null;
  });

  protected ask(change: Partial<ToolQuery>): void {
    this.query.update((query) => ({ ...query, ...change }));
  }
  protected sort({ active, direction }: Sort): void {
    const sortBy = TOOL_COLUMNS.find((column) => column === active && direction !== '');
    this.ask({ sortBy: sortBy ?? 'number', direction: direction === 'desc' ? 'desc' : 'asc' });
  }
}
