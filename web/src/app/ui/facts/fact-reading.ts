import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Units } from '#contracts';
import type { FactField } from './fact-field';
import type { FactLine } from './fact-lines';
import { layOutFacts } from './fact-lines';

/** The same facts as the form shows, for reading: lines of name and value, lists as tables. */
@Component({
  selector: 'nl-fact-reading',
  templateUrl: './fact-reading.html',
  styleUrl: './fact-reading.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FactReading {
  readonly fields = input.required<readonly FactField[]>();
  readonly value = input.required<unknown>();
  readonly units = input.required<Units>();
  /** Whether what nobody stated is shown as such or left out. */
  readonly leaveOutUnsaid = input(false);

  protected readonly lines = computed<readonly FactLine[]>(() =>
    layOutFacts(this.fields(), this.value(), {
      units: this.units(),
      now: new Date(),
      leaveOutUnsaid: this.leaveOutUnsaid(),
    }),
  );
}
