import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { readDropped } from './dropped-files';

/** Takes files by drag and drop, or by the button for those who work without a mouse. */
@Component({
  selector: 'nl-drop-zone',
  imports: [MatButton, MatIcon],
  templateUrl: './drop-zone.html',
  styleUrl: './drop-zone.scss',
  host: {
    '[class.over]': 'over()',
    '[class.closed]': 'closed()',
    '(dragenter)': 'enter($event)',
    '(dragover)': 'enter($event)',
    '(dragleave)': 'leave($event)',
    '(drop)': 'drop($event)',
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DropZone {
  /** Why nothing can be dropped now; null when it can. */
  readonly closed = input<string | null>(null);
  /** What the upload limit is, in words. */
  readonly limit = input<string>();
  readonly filesChosen = output<readonly File[]>();

  protected readonly over = signal(false);
  protected readonly folders = signal<readonly string[]>([]);

  protected enter(event: DragEvent): void {
    event.preventDefault();
    if (event.dataTransfer) event.dataTransfer.dropEffect = this.closed() ? 'none' : 'copy';
    this.over.set(!this.closed());
  }

  protected leave(event: DragEvent): void {
    const into = event.relatedTarget;
    const host = event.currentTarget;
    if (into instanceof Node && host instanceof Node && host.contains(into)) return;
    this.over.set(false);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    if (this.closed()) return;
    const { files, folders } = readDropped(event.dataTransfer);
    this.folders.set(folders);
    if (files.length) this.filesChosen.emit(files);
  }

  protected pick(chooser: HTMLInputElement): void {
    const files = Array.from(chooser.files ?? []);
    // Cleared, so that the same file may be chosen again after it was mended.
    chooser.value = '';
    this.folders.set([]);
    if (files.length) this.filesChosen.emit(files);
  }
}
