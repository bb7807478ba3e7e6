import type { FactSection, FigureField } from '../ui/facts/fact-field';
import { figure, length, maybe } from '../ui/facts/fact-field';

const axis = (field: FigureField) => ({ ...maybe(field), empty: 'not set' });

/** The work-offset table of one machine, wrapped under `work` so that it has a field of its own. */
export const OFFSET_SECTIONS: readonly FactSection[] = [
  {
    title: 'Work offsets',
    help: 'Where each work zero stands, in machine coordinates, as the controller shows it. Leave an axis empty that is set anew for each job.',
    fields: [
      {
        type: 'map',
        key: 'work',
        label: 'Offsets',
        unlabelled: true,
        entry: 'offset',
        keyLabel: 'Offset',
        keyExample: 'G54',
        value: {
          type: 'group',
          key: 'value',
          label: 'Place of work zero',
          unlabelled: true,
          inline: true,
          fields: [
            axis(length('x', 'X')),
            axis(length('y', 'Y')),
            axis(length('z', 'Z')),
            axis(figure('a', 'A', 'degrees')),
          ],
        },
        start: {},
      },
    ],
  },
];
