import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-change-macro-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Change macro" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeMacroPage {}
