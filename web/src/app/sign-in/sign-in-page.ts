import { ChangeDetectionStrategy, Component } from '@angular/core';
import { PageHeader } from '../ui/page-header/page-header';

@Component({
  selector: 'nl-sign-in-page',
  imports: [PageHeader],
  template: '<nl-page-header heading="Sign in" />',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {}
