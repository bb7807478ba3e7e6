import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/**
 * Top of a page: its heading, a small addition beside it, one line of facts under it (projected),
 * and the page's acts at the right (`slot="acts"`).
 */
@Component({
  selector: 'nl-page-header',
  templateUrl: './page-header.html',
  styleUrl: './page-header.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageHeader {
  readonly heading = input.required<string>();
  readonly aside = input<string>();
}
