import type { PipeTransform } from '@angular/core';
import { Pipe } from '@angular/core';
import { formatCount } from './count';

/** `{{ lines | count }}`: thousands parted by a thin space. */
@Pipe({ name: 'count' })
export class CountPipe implements PipeTransform {
  transform(count: number): string {
    return formatCount(count);
  }
}
