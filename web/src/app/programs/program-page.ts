import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-program-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Program" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramPage {}
