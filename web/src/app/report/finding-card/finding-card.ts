import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import type { ProgramText } from '#engine';
import { counted, formatCount } from '../../ui/count';
import { SeverityMark } from '../../ui/severity-mark/severity-mark';
import { markLine } from '../line-report/mark-line';
import type { RunMode, ShownFinding } from '../shown-finding';

/**
 * One finding as a person reads it: its sentence and what to do, with the shape and word of its
 * severity. Says too how often it recurs, where it is worst, and which line of a macro did it.
 */
@Component({
  selector: 'nl-finding-card',
  imports: [SeverityMark],
  templateUrl: './finding-card.html',
  styleUrl: './finding-card.scss',
  host: {
    '[class]': 'shown().severity',
    '[class.current]': 'current()',
    '[attr.aria-current]': 'current() || null',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingCard {
  readonly #snackBar = inject(MatSnackBar);

  readonly shown = input.required<ShownFinding>();
  readonly mode = input<RunMode>('attended');
  readonly current = input(false);
  /** Texts a finding may lie within: the change macro and the setup's subprograms. */
  readonly texts = input<readonly ProgramText[]>([]);
  /** Whether the card names its line; in the line report it stands right under it. */
  readonly namesLine = input(false);
  readonly lineAsked = output<number>();

  protected readonly extent = computed(() => {
    const { count, line, endLine } = this.shown();
    if (count <= 1) return '';
    const blocks = counted(count, 'block');
    return endLine > line ? `${blocks}, to line ${formatCount(endLine)}` : blocks;
  });
  protected readonly worstLine = computed(() => {
    const { finding, line } = this.shown();
    return finding.worstLine === line ? null : finding.worstLine;
  });
  protected readonly otherwise = computed(() => {
    const other = this.shown().otherwise;
    if (!other) return '';
    return this.mode() === 'attended' ? `unattended: ${other}` : `attended: ${other}`;
  });
  protected readonly answeredBy = computed(() => {
    const { finding, severity } = this.shown();
    if (severity !== 'hold' || !finding.hold) return '';
    return finding.hold === 'look'
      ? 'someone at the machine can answer it'
      : 'a programmer or lead must judge';
  });
  protected readonly within = computed(() => {
    const { within } = this.shown().finding;
    if (!within) return null;
    const text = this.texts().find((each) => each.name === within.text)?.text;
    const line = text?.split(/\r\n|\r|\n/)[within.line - 1];
    const marks = within.columns
      ? [{ columns: within.columns, severity: this.shown().severity }]
      : [];
    return {
      name: within.text,
      line: within.line,
      pieces: line === undefined ? [] : markLine(line, marks),
    };
  });

  protected count(line: number): string {
    return formatCount(line);
  }

  protected async copyLink(): Promise<void> {
    const link = new URL(location.href);
    link.search = '';
    link.searchParams.set('finding', this.shown().id);
    try {
      await navigator.clipboard.writeText(link.href);
      this.#snackBar.open('Link to this finding copied.');
    } catch {
      // Clipboards are closed to pages served without TLS: show the link, so that it can be copied by hand.
      this.#snackBar.open(link.href, 'Close', { duration: 30_000 });
    }
  }
}
