import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-no-such-page',
  imports: [Notice, PageHeader, RouterLink],
  template: `<nl-page-header heading="There is no such page" />
    <nl-notice kind="empty">
      The address may be mistyped, or the thing it named is gone.
      <a routerLink="/bench">Go to the bench</a>
    </nl-notice>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoSuchPage {}
