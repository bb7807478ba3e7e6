import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-first-run-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="First set-up" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstRunPage {}
