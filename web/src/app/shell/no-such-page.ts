import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Notice } from '../ui/notice/notice';

@Component({
  selector: 'nl-no-such-page',
  imports: [Notice, RouterLink],
  template: `<nl-notice kind="empty" heading="There is no such page">
    The address may be mistyped, or the thing it named is gone.
    <a routerLink="/bench">Go to the bench</a>
  </nl-notice>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoSuchPage {}
