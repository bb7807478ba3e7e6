import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import type { MachineList } from '#contracts';

/** The shop's machines as a row to change between; left out where there is only one. */
@Component({
  selector: 'nl-machine-tabs',
  imports: [RouterLink, RouterLinkActive],
  templateUrl: './machine-tabs.html',
  styleUrl: './machine-tabs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachineTabs {
  readonly machines = input.required<MachineList['machines']>();
  /** The place that shows one machine: `/racks`. */
  readonly place = input.required<string>();
}
