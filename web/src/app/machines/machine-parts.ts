import type { Observable } from 'rxjs';
import type { MachineDetails, Permission } from '#contracts';
import { controllerSchema, machineSchema, offsetsSchema, rackSchema } from '#contracts';
import type { FactSection } from '../ui/facts/fact-field';
import type { FactChange, Held, Standing } from '../ui/facts/revised-facts';
import { CONTROLLER_SECTIONS } from './controller-fields';
import type { MachineClient, RevisedPart } from './machine-client';
import { MACHINE_SECTIONS } from './machine-fields';
import { OFFSET_SECTIONS } from './offset-fields';
import { RACK_SECTIONS } from './rack-fields';

export const PART_NAMES = ['description', 'controller', 'rack', 'offsets'] as const;
export type PartName = (typeof PART_NAMES)[number];

/** One part of a machine that is read and revised by itself. */
export interface MachinePart {
  readonly title: string;
  /** What a revision is of. Machine and controller are one revision between them. */
  readonly subject: string;
  readonly sections: readonly FactSection[];
  readonly may: Permission;
  readonly revisionsOf: RevisedPart;
  readonly standing: (details: MachineDetails) => Standing;
  readonly validate: (value: Readonly<Record<string, unknown>>) => Held;
  readonly save: (
    client: MachineClient,
    details: MachineDetails,
    change: FactChange,
  ) => Observable<MachineDetails>;
}

/** The whole setup refuses a pocket number that stands twice; a rack by itself must, too. */
const rackWithoutTwins = rackSchema.superRefine(({ pockets }, context) => {
  const numbers = pockets.map((pocket) => pocket.number);
  numbers.forEach((number, index) => {
    if (numbers.indexOf(number) === index) return;
    context.addIssue({
      code: 'custom',
      path: ['pockets', index, 'number'],
      message: `pocket ${number} stands here twice`,
    });
  });
});
const workSchema = offsetsSchema.pick({ work: true });

export const MACHINE_PARTS: Readonly<Record<PartName, MachinePart>> = {
  description: {
    title: 'Machine',
    subject: 'description',
    sections: MACHINE_SECTIONS,
    may: 'change-machine',
    revisionsOf: 'description',
    standing: ({ machine, revision }) => ({ value: { ...machine }, revision }),
    validate: (value) => machineSchema.safeParse(value),
    save: (client, { id, controller }, { value, basedOn, reason }) =>
      client.saveDescription(id, {
        basedOn,
        reason,
        machine: machineSchema.parse(value),
        controller,
      }),
  },
  controller: {
    title: 'Controller',
    subject: 'description',
    sections: CONTROLLER_SECTIONS,
    may: 'change-machine',
    revisionsOf: 'description',
    standing: ({ controller, revision }) => ({ value: { ...controller }, revision }),
    validate: (value) => controllerSchema.safeParse(value),
    save: (client, { id, machine }, { value, basedOn, reason }) =>
      client.saveDescription(id, {
        basedOn,
        reason,
        machine,
        controller: controllerSchema.parse(value),
      }),
  },
  rack: {
    title: 'Rack',
    subject: 'rack',
    sections: RACK_SECTIONS,
    may: 'change-rack',
    revisionsOf: 'rack',
    standing: ({ rack, rackRevision }) => ({ value: { ...rack }, revision: rackRevision }),
    validate: (value) => rackWithoutTwins.safeParse(value),
    save: (client, { id }, { value, basedOn, reason }) =>
      client.saveRack(id, { basedOn, reason, rack: rackSchema.parse(value) }),
  },
  offsets: {
    title: 'Work offsets',
    subject: 'offsets',
    sections: OFFSET_SECTIONS,
    may: 'change-work-offsets',
    revisionsOf: 'offsets',
    standing: ({ work, offsetRevision }) => ({ value: { work }, revision: offsetRevision }),
    validate: (value) => workSchema.safeParse(value),
    save: (client, { id }, { value, basedOn, reason }) =>
      client.saveOffsets(id, { basedOn, reason, work: workSchema.parse(value).work }),
  },
};
