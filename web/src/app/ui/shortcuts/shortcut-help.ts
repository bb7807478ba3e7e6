import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatSlideToggle } from '@angular/material/slide-toggle';
import type { Shortcut } from './shortcut';
import { Shortcuts } from './shortcuts';

/** The list of keys that act here, by place; opened with `?`. */
@Component({
  selector: 'nl-shortcut-help',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatSlideToggle,
  ],
  templateUrl: './shortcut-help.html',
  styleUrl: './shortcut-help.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShortcutHelp {
  protected readonly shortcuts = inject(Shortcuts);

  protected readonly places = computed(() => {
    const places = new Map<string, { keys: readonly string[]; does: string }[]>();
    for (const each of this.shortcuts.all()) {
      places.set(each.place, [...(places.get(each.place) ?? []), asRow(each)]);
    }
    return [...places].map(([place, rows]) => ({ place, rows }));
  });
}

function asRow(shortcut: Shortcut): { keys: readonly string[]; does: string } {
  return { keys: shortcut.keys.split(' '), does: shortcut.does };
}
