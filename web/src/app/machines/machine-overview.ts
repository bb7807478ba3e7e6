import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { CurrentUser } from '../sign-in/current-user';
import { ToolClient } from '../tools/tool-client';
import { MomentPipe } from '../ui/moment-pipe';
import { RackStrip } from '../ui/rack-strip/rack-strip';
import { TablePlan } from '../ui/table-plan/table-plan';
import { MachineOnPage } from './machine-on-page';
import { overviewOf } from './machine-words';

/** A machine on one page: its rack as it stands, its table, the figures asked most, who changed what. */
@Component({
  selector: 'nl-machine-overview',
  imports: [MomentPipe, RackStrip, RouterLink, TablePlan],
  templateUrl: './machine-overview.html',
  styleUrl: './machine-overview.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachineOverview {
  readonly #tools = inject(ToolClient);
  protected readonly page = inject(MachineOnPage);
  protected readonly units = inject(CurrentUser).units;

  readonly #toolList = rxResource({ stream: () => this.#tools.list() });
  protected readonly tools = computed(() =>
    this.#toolList.hasValue() ? this.#toolList.value().map((record) => record.tool) : [],
  );
  protected readonly facts = computed(() => {
    const machine = this.page.machine();
    return machine ? overviewOf(machine, this.units()) : [];
  });
  protected readonly standing = computed(() => {
    const machine = this.page.machine();
    if (!machine) return [];
    const { id } = machine;
    return [
      { what: 'Description', to: ['/machines', id, 'description'], revision: machine.revision },
      { what: 'Rack', to: ['/machines', id, 'rack'], revision: machine.rackRevision },
      { what: 'Loading', to: ['/racks', id], revision: machine.loadingRevision },
      { what: 'Work offsets', to: ['/machines', id, 'offsets'], revision: machine.offsetRevision },
      { what: 'Change macro', to: ['/change-macro', id], revision: machine.macroRevision },
    ];
  });
}
