import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-tools-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Tools" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolsPage {}
