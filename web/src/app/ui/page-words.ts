import { Injectable } from '@angular/core';
import { MatPaginatorIntl } from '@angular/material/paginator';
import { formatCount } from './count';

/** The words under a list that has pages. */
@Injectable()
export class PageWords extends MatPaginatorIntl {
  override itemsPerPageLabel = 'rows on a page';
  override nextPageLabel = 'Next page';
  override previousPageLabel = 'Page before';
  override firstPageLabel = 'First page';
  override lastPageLabel = 'Last page';
  override getRangeLabel = (page: number, pageSize: number, length: number): string => {
    if (length === 0 || pageSize === 0) return 'none';
    const from = page * pageSize + 1;
    const to = Math.min(length, (page + 1) * pageSize);
    return `${formatCount(from)} to ${formatCount(to)} of ${formatCount(length)}`;
  };
}
