import type { PipeTransform } from '@angular/core';
import { Pipe, inject } from '@angular/core';
import { CurrentUser } from '../sign-in/current-user';
import { formatLength } from './length';

/** `{{ mm | length }}`: a length in the units of the person who looks. */
// Impure because the person's units are a signal outside its arguments; the work is one division.
@Pipe({ name: 'length', pure: false })
export class LengthPipe implements PipeTransform {
  readonly #user = inject(CurrentUser);

  transform(mm: number | null | undefined, decimals?: number): string {
    return formatLength(mm, this.#user.units(), decimals);
  }
}
