import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { MarkKind } from '../severity-mark/mark-kind';
import { SeverityMark } from '../severity-mark/severity-mark';

/**
 * The verdict of a check or proof across the page: `lead` in bold ("Stopped."), then the projected
 * sentence; `slot="caution"` for the standing caution and `slot="figures"` for the figures at the
 * right.
 */
@Component({
  selector: 'nl-verdict-banner',
  imports: [SeverityMark],
  templateUrl: './verdict-banner.html',
  styleUrl: './verdict-banner.scss',
  host: { '[class]': 'kind()', role: 'status' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictBanner {
  readonly kind = input.required<MarkKind>();
  readonly lead = input.required<string>();

  protected readonly markWord = computed(() => this.lead().replace(/\.$/, ''));
}
