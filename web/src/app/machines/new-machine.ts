import type { SetupImport as SetupToImport } from '#contracts';
import { controllerSchema, machineSchema, rackSchema } from '#contracts';
import type { FactSection } from '../ui/facts/fact-field';
import type { Held } from '../ui/facts/revised-facts';
import * as z from 'zod';
import { CONTROLLER_SECTIONS } from './controller-fields';
import { MACHINE_SECTIONS } from './machine-fields';
import { RACK_SECTIONS } from './rack-fields';

type Facts = Readonly<Record<string, unknown>>;

/** The sections of all three parts, so that a whole machine is one form. */
const under = (key: string, label: string, sections: readonly FactSection[]) =>
  sections.map((section) => ({ ...section, under: { key, label } }));
export const NEW_MACHINE_SECTIONS: readonly FactSection[] = [
  ...under('machine', 'Machine', MACHINE_SECTIONS),
  ...under('controller', 'Controller', CONTROLLER_SECTIONS),
  ...under('rack', 'Rack', RACK_SECTIONS),
];

/**
 * What a new machine starts from: what the contract itself assumes when nothing is said, and how a
 * controller by NISTIR 6556 stands at power-on. No figure of a machine is made up: each stays empty
 * until someone fills it in, and how T, T0 and lengths work here must be answered.
 */
export const NEW_MACHINE: Facts = {
  machine: {
    changeTravel: {},
    references: {},
    changePoint: null,
    changeSeconds: 15,
    spindle: { waits: false },
    bodies: [],
    zones: [],
  },
  controller: {
    language: 'rs274ngc',
    defaults: {
      units: 'mm',
      plane: 'xy',
      distance: 'absolute',
      arcCentre: 'incremental',
      feed: 'per-minute',
      workOffset: 'G54',
      return: 'G98',
      path: 'G64',
    },
    dwell: 'seconds',
    numbers: 'decimal',
    longestBlock: 256,
    changeOn: 'M6',
    changeStopsSpindle: false,
    lengthReference: 0,
    diameterOffsetShift: 0,
    switches: controllerSchema.shape.switches.parse(undefined),
  },
  rack: { bodies: [], pockets: [] },
};

const newMachineSchema = z.strictObject({
  machine: machineSchema,
  controller: controllerSchema,
  rack: rackSchema,
});

export function validateNewMachine(facts: Facts): Held<z.output<typeof newMachineSchema>> {
  return newMachineSchema.safeParse(facts);
}

/** The setup document of a machine that was just described: nothing loaded, the spindle not known. */
export function setupOf(parts: z.output<typeof newMachineSchema>, reason: string): SetupToImport {
  return {
    setup: {
      format: 'nightlatch-setup',
      version: 1,
      ...parts,
      loading: { pockets: [], inSpindle: 'unknown', byHand: [] },
      tools: [],
      offsets: {},
    },
    reason,
  };
}
