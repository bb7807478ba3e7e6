import type { MachineDetails, Units } from '#contracts';
import { CONTROLLER_SECTIONS } from './controller-fields';
import type { FactField } from '../ui/facts/fact-field';
import { wordFact } from '../ui/facts/fact-words';
import { wordFigure } from '../ui/facts/measure';

export interface OverviewFact {
  readonly label: string;
  readonly words: string;
}

/** The figures a person asks for most, in words. */
export function overviewOf(details: MachineDetails, units: Units): readonly OverviewFact[] {
  const { machine, rack, controller } = details;
  const span = (axis: 'x' | 'y' | 'z') => {
    const [from, to] = machine.travel[axis];
    return wordFigure(to - from, 'length', units);
  };
  const { minRpm, maxRpm } = machine.spindle;
  return [
    { label: 'Travel X, Y, Z', words: `${span('x')}, ${span('y')}, ${span('z')}` },
    { label: 'Spindle', words: `${minRpm} to ${wordFigure(maxRpm, 'rpm', units)}` },
    {
      label: 'Spoilboard’s top',
      words: machine.spoilboard
        ? `Z ${wordFigure(machine.spoilboard.top, 'length', units)}`
        : 'not said',
    },
    {
      label: 'Rack',
      words: `${rack.edge} edge, ${rack.pockets.length} pockets, ${tapersOf(details)}`,
    },
    { label: 'Dust boot', words: bootOf(details) },
    { label: 'T names', words: choiceOf('toolWord', controller.toolWord) },
    { label: 'Who changes', words: choiceOf('toolChange', controller.toolChange) },
    { label: 'Length table', words: choiceOf('lengthScheme', controller.lengthScheme) },
    { label: 'Power-on units', words: controller.defaults.units === 'mm' ? 'mm' : 'inches' },
  ];
}

function tapersOf({ rack }: MachineDetails): string {
  const tapers = [...new Set(rack.pockets.map((pocket) => pocket.taper))];
  return tapers.length === 0 ? 'no taper yet' : tapers.join(' and ');
}

function bootOf({ machine }: MachineDetails): string {
  const boot = machine.bodies.find((body) => body.boot !== undefined)?.boot;
  if (boot === undefined) return 'none described';
  return { stays: 'stays down during a change', lifts: 'lifts', docks: 'is put down' }[boot];
}

function choiceOf(key: string, value: string): string {
  const fields: readonly FactField[] = CONTROLLER_SECTIONS.flatMap((section) => section.fields);
  const field = fields.find((each) => each.key === key);
  return field ? wordFact(field, value, 'mm', new Date(0)) : value;
}
