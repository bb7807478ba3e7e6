import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-people-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="People" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {}
