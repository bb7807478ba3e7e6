import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-bench-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Bench" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage {}
