import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Revision } from '#contracts';
import { MomentPipe } from '../moment-pipe';

/** Who made which revision, when and why; newest first. */
@Component({
  selector: 'nl-revision-list',
  imports: [MomentPipe],
  templateUrl: './revision-list.html',
  styleUrl: './revision-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionList {
  readonly revisions = input.required<readonly Revision[]>();
}
