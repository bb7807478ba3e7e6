import { ChangeDetectionStrategy, Component, effect, inject, input } from '@angular/core';
import { MatTabLink, MatTabNav, MatTabNavPanel } from '@angular/material/tabs';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { MomentPipe } from '../ui/moment-pipe';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { LastMachine } from './last-machine';
import { MachineOnPage } from './machine-on-page';

const PAGES = [
  { path: 'overview', word: 'Overview' },
  { path: 'description', word: 'Machine' },
  { path: 'controller', word: 'Controller' },
  { path: 'rack', word: 'Rack' },
  { path: 'offsets', word: 'Work offsets' },
  { path: 'setup', word: 'Setup file' },
] as const;

/** One machine: its pages and the place to change between them. */
@Component({
  selector: 'nl-machine-page',
  imports: [
    MatTabLink,
    MatTabNav,
    MatTabNavPanel,
    MomentPipe,
    Notice,
    PageHeader,
    RouterLink,
    RouterLinkActive,
    RouterOutlet,
  ],
  providers: [MachineOnPage],
  templateUrl: './machine-page.html',
  styleUrl: './machine-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MachinePage {
  readonly #last = inject(LastMachine);
  protected readonly page = inject(MachineOnPage);

  readonly machineId = input.required<string>();

  protected readonly pages = PAGES;

  constructor() {
    effect(() => {
      this.page.open(this.machineId());
      this.#last.remember(this.machineId());
    });
  }
}
