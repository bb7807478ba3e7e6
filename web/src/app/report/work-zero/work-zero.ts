import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Units } from '#contracts';
import type { Offsets, Report } from '#engine';
import { formatLength, signed } from '../../ui/length';
import type { WindowRow } from './lay-out-window';
import { layOutWindows } from './lay-out-window';

/** Where each work offset may stand so that the program stays within travel, and where it stands. */
@Component({
  selector: 'nl-work-zero',
  templateUrl: './work-zero.html',
  styleUrl: './work-zero.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WorkZero {
  readonly windows = input.required<Report['workZeroWindow']>();
  readonly work = input.required<Offsets['work']>();
  readonly units = input<Units>('mm');

  protected readonly rows = computed(() =>
    layOutWindows(this.windows(), this.work()).map((row) => ({
      ...row,
      name: `${row.offset} ${row.axis.toUpperCase()}`,
      least: this.#figure(row.from),
      most: this.#figure(row.to),
      sentence: this.#word(row),
    })),
  );

  #word(row: WindowRow): string {
    const length = (mm: number) => formatLength(mm, this.units());
    switch (row.state) {
      case 'nowhere':
        return `fits nowhere: ${length(row.by)} longer than the travel`;
      case 'unset':
        return 'has no value yet';
      case 'inside':
        return `stands at ${length(row.value!)}`;
      case 'outside':
        return `stands at ${length(row.value!)}: move it at least ${length(row.by)} ${row.toward}`;
    }
  }
  #figure(mm: number): string {
    const value = this.units() === 'mm' ? mm.toFixed(1) : (mm / 25.4).toFixed(3);
    return signed(/^-0\.?0*$/.test(value) ? value.slice(1) : value);
  }
}
