import type { FactField, FactSection, ListField } from '../ui/facts/fact-field';
import { figure, length, maybe, point } from '../ui/facts/fact-field';

/** Tapers a fork may be cut for. The family alone is not enough: flanges differ. */
export const TAPERS = [
  'ISO20',
  'ISO25',
  'ISO30',
  'ISO40',
  'BT30',
  'BT40',
  'SK30',
  'SK40',
  'CAT30',
  'CAT40',
  'HSK-E25',
  'HSK-E32',
  'HSK-E40',
  'HSK-F50',
  'HSK-F63',
] as const;

const POCKET_FIELDS: readonly FactField[] = [
  figure('number', 'Number', 'whole', 'As painted on the rack.'),
  point('grip', 'Grip', 'Machine place of the nose when the holder sits home in the fork.'),
  {
    type: 'choice',
    key: 'opens',
    label: 'Slides out',
    choices: [
      { value: '+x', label: 'to the right (+X)' },
      { value: '-x', label: 'to the left (−X)' },
      { value: '+y', label: 'to the back (+Y)' },
      { value: '-y', label: 'to the front (−Y)' },
    ],
    help: 'The direction in which a holder leaves the fork.',
  },
  length('largestDiameter', 'Widest tool', 'Cutter or holder, between the neighbours.'),
  length('longest', 'Longest tool', 'Gauge line to tip, before it meets what is below.'),
  {
    type: 'text',
    key: 'taper',
    label: 'Taper family',
    suggestions: TAPERS,
    help: 'Measure the flange too: the same number is made with different ones.',
  },
  {
    type: 'choice',
    key: 'kind',
    label: 'Kind',
    choices: [
      { value: 'fork', label: 'fork' },
      { value: 'cup', label: 'cup' },
    ],
    help: 'A holder slides out of a fork and lifts out of a cup.',
  },
  maybe(figure('heaviest', 'Heaviest tool', 'mass', 'With its holder.')),
  {
    type: 'group',
    key: 'taught',
    label: 'Taught',
    optional: true,
    presence: 'taught at the machine',
    start: { at: '', by: '' },
    fields: [
      { type: 'moment', key: 'at', label: 'When' },
      { type: 'text', key: 'by', label: 'By whom' },
    ],
  },
];

export const POCKETS: ListField = {
  type: 'list',
  key: 'pockets',
  label: 'Pockets',
  unlabelled: true,
  entry: 'pocket',
  namedBy: 'number',
  fields: POCKET_FIELDS,
  start: { opens: '-y', kind: 'fork' },
};

export const RACK_SECTIONS: readonly FactSection[] = [
  {
    title: 'Rack',
    fields: [
      { type: 'text', key: 'name', label: 'Name' },
      {
        type: 'choice',
        key: 'edge',
        label: 'Edge of the table',
        choices: [
          { value: 'front', label: 'front' },
          { value: 'back', label: 'back' },
          { value: 'left', label: 'left' },
          { value: 'right', label: 'right' },
        ],
        help: 'For the drawing; the pockets’ places decide everything else.',
      },
      length(
        'slideOut',
        'Slides out by',
        'How far a holder moves along its fork before it is free.',
      ),
      {
        type: 'group',
        key: 'gripTolerance',
        label: 'How exactly the head must stand at a pocket',
        inline: true,
        fields: [length('xy', 'Sideways'), length('z', 'In height')],
      },
      {
        type: 'group',
        key: 'fork',
        label: 'Fork',
        help: 'The plate at each pocket.',
        fields: [
          length('width', 'Width', 'Across the mouth, outside to outside.'),
          length('reach', 'Reach', 'From the grip to the ends of the tines.'),
          length('thickness', 'Thickness', 'Height of the plate.'),
          length(
            'below',
            'Top under gauge line',
            'How far the plate’s top lies under the gauge line.',
          ),
        ],
      },
      {
        type: 'list',
        key: 'bodies',
        label: 'What else stands there',
        entry: 'body',
        namedBy: 'name',
        start: { name: '', box: { min: {}, max: {} } },
        help: 'The rail, the posts, a cover: machine coordinates.',
        fields: [
          { type: 'text', key: 'name', label: 'Name' },
          { type: 'box', key: 'box', label: 'Box' },
        ],
      },
    ],
  },
  { title: 'Pockets', fields: [POCKETS] },
];
