import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Router } from '@angular/router';
import { CurrentUser } from '../sign-in/current-user';

/** Opens the first page of the Shop place that the person may see. */
@Component({
  selector: 'nl-shop-start',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShopStart {
  constructor() {
    const user = inject(CurrentUser);
    const page = user.may('manage-people') ? 'people' : user.may('set-policy') ? 'settings' : 'you';
    void inject(Router).navigate(['/shop', page], { replaceUrl: true });
  }
}
