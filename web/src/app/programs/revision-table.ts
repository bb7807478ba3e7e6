import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MatIconAnchor } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import type { ProgramRevision } from '#contracts';
import { formatBytes } from '../ui/count';
import { CountPipe } from '../ui/count-pipe';
import { MomentPipe } from '../ui/moment-pipe';
import { markOfCheck } from '../ui/severity-mark/mark-kind';
import { SeverityMark } from '../ui/severity-mark/severity-mark';

/** Every revision of a program, newest first, with its bytes to take away and its checks. */
@Component({
  selector: 'nl-revision-table',
  imports: [CountPipe, MatIcon, MatIconAnchor, MomentPipe, RouterLink, SeverityMark],
  templateUrl: './revision-table.html',
  styleUrl: './revision-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionTable {
  readonly revisions = input.required<readonly ProgramRevision[]>();

  protected readonly rows = computed(() =>
    this.revisions()
      .toSorted((one, other) => other.number - one.number)
      .map((revision) => ({
        ...revision,
        size: formatBytes(revision.bytes),
        shortHash: `${revision.sha256.slice(0, 4)}…${revision.sha256.slice(-4)}`,
        address: `/api/v1/program-revisions/${revision.id}/text`,
        checks: revision.checks.map((check) => ({ ...check, mark: markOfCheck(check) })),
      })),
  );
}
