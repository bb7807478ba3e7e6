import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-program-list-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Programs" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramListPage {}
