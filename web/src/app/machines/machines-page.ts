import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-machines-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Machine" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachinesPage {}
