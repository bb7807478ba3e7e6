import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-report-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Check report" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReportPage {}
