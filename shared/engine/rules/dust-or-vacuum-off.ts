import { openSpan } from '../geometry/span';
import type { DeedEvent } from '../interpreter/events';
import { Material } from '../shop/material';
import type { CodeDeed, DeclaredCode } from '../shop/setup';
import { listed, text } from './finding-data';
import { movedWords } from './placing';
import { defineRule } from './rule';

/** Cuts while extraction or vacuum, which the program can switch here, is off. */
export const dustOrVacuumOff = defineRule({
  id: 'dust-or-vacuum-off',
  group: 'spindle-and-feed',
  title: 'Cuts with extraction or vacuum off',
  severity: 'note',
  unattended: 'stop',
  protects: 'The shop from dust and fire, and the work from coming loose.',
  explanation:
    'Only where the setup declares a code that switches it on. Off is how a program finds it. Whether the blower really runs, and whether the vacuum holds, cannot be seen. Common practice, no source.',
  examples: {
    setup: { controller: { codes: [{ code: 'M70', does: 'extraction-on' }] } },
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nM70\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
  },
  word: (data) => ({
    message: `Cuts while the ${text(data, 'what')} is off.`,
    advice: `Switch it on with ${text(data, 'codes')} before the first cut.`,
  }),
  observe: (shop, report) => {
    const { codes } = shop.setup.controller;
    const switches = [
      openSwitch('extraction', 'extraction-on', 'extraction-off', codes),
      openSwitch('vacuum', 'vacuum-on', 'vacuum-off', codes),
    ].filter((each) => each.codes !== '');
    if (switches.length === 0) return {};
    const material = new Material(shop);
    const span = openSpan();
    return {
      deed(event) {
        for (const each of switches) each.note(event);
      },
      quiet({ feed }, state) {
        if (!switches.every((each) => each.isOn())) material.keepClear(feed, state);
      },
      motion(motion, state) {
        if (switches.every((each) => each.isOn())) return;
        if (motion.kind !== 'feed' && motion.kind !== 'arc') return;
        if (state.turning === 'off' || motion.by === 'change') return;
        if (!material.isMet(motion, state, span)) return;
        for (const { what, codes: on, isOn } of switches) {
          if (isOn()) continue;
          const at = state.place(movedWords(motion));
          report.found({ cause: what, at, data: { what, codes: on } }, state);
        }
      },
    };
  },
});

function openSwitch(what: string, on: CodeDeed, off: CodeDeed, declared: readonly DeclaredCode[]) {
  let isOn = false;
  return {
    what,
    codes: listed(declared.filter((each) => each.does === on).map(wordCode)),
    isOn: () => isOn,
    note(event: DeedEvent) {
      if (event.does === on) isOn = true;
      if (event.does === off) isOn = false;
    },
  };
}

function wordCode(code: DeclaredCode): string {
  const where = Object.entries(code.where ?? {}).map(([letter, value]) => `${letter}${value}`);
  return [code.code, ...where].join(' ');
}
