import type { Loading, Rack } from '#engine';
import type { Mouth, RackSlot, SlotState } from './rack-slot';

const OPEN_WORDS: Readonly<Record<Mouth, string>> = {
  toward: 'forks open toward you',
  away: 'forks open away from you',
  left: 'forks open to the left',
  right: 'forks open to the right',
};
/** From where the rack is seen, and where its forks open. */
export function viewSentence(rack: Rack, slots: readonly RackSlot[]): string {
  const from = {
    front: 'seen from the front',
    back: 'seen from the front',
    left: 'seen from the left of the machine, its back on your left',
    right: 'seen from the right of the machine, its front on your left',
  }[rack.edge];
  const mouths = new Set(slots.filter((slot) => slot.pocket !== null).map((slot) => slot.mouth));
  const [only] = mouths;
  const open = mouths.size === 1 && only ? OPEN_WORDS[only] : 'forks open as drawn';
  const called = slots.some((slot) => slot.order !== null);
  return [from, ...(mouths.size > 0 ? [open] : [])]
    .concat(called ? ['numbers in brass: order of call'] : [])
    .join(' · ');
}

const STATE_WORDS: Readonly<Record<SlotState, string>> = {
  loaded: '',
  empty: '',
  'in-spindle': 'it is in the spindle, so this fork stands empty',
  'not-in-rack': 'it is in no pocket of this rack',
  'by-hand': 'it is fitted by hand',
};
/** A place of the rack in one sentence, for those who do not see the drawing. */
export function sentenceOf(slot: Omit<RackSlot, 'sentence'>): string {
  const what =
    slot.tool === null ? 'empty' : `${slot.label}${slot.toolName ? `, ${slot.toolName}` : ''}`;
  const parts = [
    slot.pocket === null ? what : `${capital(slot.place)}: ${what}`,
    slot.pocket === null && slot.state === 'in-spindle'
      ? 'it is in the spindle and has no pocket'
      : STATE_WORDS[slot.state],
    slot.order === null ? '' : `called ${ordinal(slot.order)}`,
    ...slot.marks.map((mark) => mark.word),
  ];
  return `${parts.filter((part) => part !== '').join('; ')}.`;
}

/** What the drawing cannot show: what the spindle holds, tools fitted by hand. */
export function remarksOf(loading: Loading): readonly string[] {
  const remarks: string[] = [];
  if (loading.inSpindle === 'unknown') {
    remarks.push('What the spindle holds is not known: any fork may be full. Look before the run.');
  } else if (loading.inSpindle === null) {
    remarks.push('The spindle holds nothing.');
  } else if (!loading.pockets.some((each) => each.tool === loading.inSpindle)) {
    remarks.push(`T${loading.inSpindle} is in the spindle and has no pocket.`);
  } else {
    remarks.push(`T${loading.inSpindle} is in the spindle; its fork stands empty now.`);
  }
  if (loading.byHand.length > 0) {
    remarks.push(
      `Fitted by hand when called: ${loading.byHand.map((each) => `T${each}`).join(', ')}.`,
    );
  }
  return remarks;
}

export function ordinal(count: number): string {
  const words = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth'];
  return words[count - 1] ?? `as number ${count}`;
}
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
