import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import type { ErrorStateMatcher } from '@angular/material/core';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import type { FactForm } from './fact-form';
import { addEntry, addMapEntry, copyEntry, removeEntry, removeMapEntry } from './fact-form';
import type { FactNode, GroupNode, ListNode, MapNode } from './fact-node';
import { suffixOf } from './measure';

/**
 * The form of one fact, and of all facts inside it. Draws by the kind of the node; what it means is
 * said once, under the field (`quiet` leaves it out, for the second and later entries of a list).
 */
@Component({
  selector: 'nl-fact-editor',
  imports: [
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MatSuffix,
    ReactiveFormsModule,
  ],
  templateUrl: './fact-editor.html',
  styleUrl: './fact-editor.scss',
  host: { '[class]': 'shape()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FactEditor {
  readonly node = input.required<FactNode>();
  readonly form = input.required<FactForm>();
  readonly quiet = input(false);

  /** Marked by the contract, not by Angular's own validators: one source of truth for what fits. */
  protected readonly matcher: ErrorStateMatcher = {
    isErrorState: () => this.node().wrong() !== null,
  };
  protected readonly help = computed(() => (this.quiet() ? undefined : this.node().field.help));
  protected readonly label = computed(() => {
    const { field } = this.node();
    const meansEmpty = field.type === 'figure' && field.empty !== undefined;
    return field.optional && !meansEmpty ? `${field.label} (if any)` : field.label;
  });
  protected readonly suffix = computed(() => {
    const { field } = this.node();
    return field.type === 'figure' ? suffixOf(field.quantity, this.form().making.units) : '';
  });

  /** How much room it takes; a group that is not stated is only its box to tick. */
  protected shape(): 'narrow' | 'middle' | 'wide' {
    const node = this.node();
    if (node.kind === 'list' || node.kind === 'map') return 'wide';
    if (node.kind === 'interval' || node.kind === 'box') return 'middle';
    if (node.kind !== 'group') return 'narrow';
    if (node.field.inline) return 'middle';
    return node.present.value ? 'wide' : 'narrow';
  }
  protected entryName(list: ListNode, entry: GroupNode, index: number): string {
    const named = entry.children.find((each) => each.field.key === list.field.namedBy);
    const name: unknown = named?.control.value;
    return `${capital(list.field.entry)} ${typeof name === 'string' && name !== '' ? name : index + 1}`;
  }
  protected add(list: ListNode): void {
    addEntry(this.form(), list);
  }
  protected copy(list: ListNode, entry: GroupNode): void {
    copyEntry(this.form(), list, entry);
  }
  protected remove(list: ListNode, entry: GroupNode): void {
    removeEntry(list, entry);
  }
  protected addPair(map: MapNode): void {
    addMapEntry(this.form(), map);
  }
  protected removePair(map: MapNode, id: string): void {
    removeMapEntry(map, id);
  }
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
