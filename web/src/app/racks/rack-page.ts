import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-rack-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Rack" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackPage {}
