import type { PipeTransform } from '@angular/core';
import { Pipe } from '@angular/core';
import { formatMoment } from './time';

/** `{{ check.finishedAt | moment }}`: when, as short as the day allows. */
@Pipe({ name: 'moment' })
export class MomentPipe implements PipeTransform {
  transform(iso: string | null | undefined): string {
    return formatMoment(iso, new Date());
  }
}
