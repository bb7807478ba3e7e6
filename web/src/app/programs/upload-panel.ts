import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import { ShopEvents } from '../http/shop-events';
import { CurrentUser } from '../sign-in/current-user';
import { formatBytes } from '../ui/count';
import { Notice } from '../ui/notice/notice';
import { DropZone } from './drop-zone';
import { MachineChoices } from './machine-choices';
import { isUnderWay } from './upload-item';
import { UploadQueue } from './upload-queue';
import { UploadRow } from './upload-row';

/** Choose the machine, drop the files, watch each arrive. */
@Component({
  selector: 'nl-upload-panel',
  imports: [
    DropZone,
    MatButton,
    MatFormField,
    MatLabel,
    MatOption,
    MatSelect,
    Notice,
    RouterLink,
    UploadRow,
  ],
  templateUrl: './upload-panel.html',
  styleUrl: './upload-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UploadPanel {
  readonly #events = inject(ShopEvents);
  readonly #user = inject(CurrentUser);
  protected readonly choices = inject(MachineChoices);
  protected readonly queue = inject(UploadQueue);

  protected readonly limit = computed(() => {
    const limit = this.#user.shop()?.uploadLimitBytes;
    return limit === undefined ? undefined : formatBytes(limit);
  });
  protected readonly machineId = computed(() => this.choices.chosen()?.id ?? null);
  protected readonly closed = computed(() => {
    if (this.choices.machines() === null) return 'Reading the machines…';
    return this.machineId() ? null : 'A program is held against a machine; none is described yet.';
  });
  protected readonly noMachine = computed(() => this.choices.machines()?.length === 0);
  protected readonly rows = computed(() =>
    this.queue.items().map((item) => ({
      item,
      progress:
        item.state.step === 'stored'
          ? (this.#events.byCheck().get(item.state.stored.checkId) ?? null)
          : null,
    })),
  );
  protected readonly anyFinished = computed(() =>
    this.queue.items().some((item) => !isUnderWay(item)),
  );
  protected readonly spoken = computed(() => {
    const items = this.queue.items();
    const count = (step: string): number => items.filter((each) => each.state.step === step).length;
    if (!items.length) return '';
    return `${items.filter(isUnderWay).length} on their way, ${count('stored')} stored, ${count('refused') + count('failed')} not taken`;
  });

  constructor() {
    void this.choices.read();
  }

  protected add(files: readonly File[]): void {
    const machineId = this.machineId();
    if (machineId) this.queue.add(files, machineId);
  }
}
