import type { FactField, FactSection } from '../ui/facts/fact-field';
import { figure, length, maybe, perAxis, point } from '../ui/facts/fact-field';

/** The machine part of the setup contract, grouped as a person goes round the machine. */
const interval = (key: string, label: string, quantity: 'length' | 'degrees' = 'length') =>
  ({ type: 'interval', key, label, quantity }) as const;

const wider = (key: string, label: string) => ({
  ...maybe(interval(key, label)),
  presence: 'has wider limits',
});

const TRAVEL: FactSection = {
  title: 'Travel',
  help: 'What the controller enforces. All places here are machine coordinates of the spindle nose: jog to a stop, read the display.',
  fields: [
    { type: 'text', key: 'name', label: 'Name', help: 'What the shop calls it.' },
    {
      type: 'group',
      key: 'travel',
      label: 'Limits of each axis',
      fields: [
        interval('x', 'X, left to right'),
        interval('y', 'Y, front to back'),
        interval('z', 'Z, low to high'),
        { ...maybe(interval('a', 'A, fourth axis', 'degrees')), presence: 'it has one' },
      ],
    },
    {
      type: 'group',
      key: 'changeTravel',
      label: 'Wider limits during a tool change only',
      help: 'Fill in an axis only if the controller lets a change go further than a program may.',
      fields: [
        wider('x', 'X in a change'),
        wider('y', 'Y in a change'),
        wider('z', 'Z in a change'),
      ],
    },
    maybe(
      point(
        'start',
        'Where the head stands before a program',
        'If not stated: least X and Y, Z up.',
      ),
    ),
    {
      type: 'group',
      key: 'references',
      label: 'Reference points',
      fields: [
        maybe(point('g28', 'G28', 'Where G28 drives to, as stored in the controller.')),
        maybe(point('g30', 'G30', 'Where G30 drives to, as stored in the controller.')),
      ],
    },
  ],
};

const MOTION: FactSection = {
  title: 'Speeds',
  help: 'From the controller’s settings. Times are worked out from these; a wrong acceleration makes a wrong run time.',
  fields: [
    perAxis('rapid', 'Rapid', 'feed', 'The speed of G0 on each axis.'),
    perAxis('maxFeed', 'Greatest feed', 'feed', 'The controller clamps any faster F to this.'),
    perAxis('acceleration', 'Acceleration', 'acceleration', 'How fast each axis gathers speed.'),
  ],
};

const SPINDLE: FactSection = {
  title: 'Spindle and drawbar',
  fields: [
    {
      type: 'group',
      key: 'spindle',
      label: 'Spindle',
      fields: [
        figure(
          'minRpm',
          'Least speed',
          'rpm',
          'Below it the spindle has no torque or will not turn.',
        ),
        figure('maxRpm', 'Greatest speed', 'rpm', 'The plate on the spindle, not the inverter.'),
        figure('spinUp', 'Time to greatest speed', 'seconds', 'Measure it from M3 to steady.'),
        figure(
          'spinDown',
          'Time to standstill',
          'seconds',
          'From greatest speed, with the heaviest tool.',
        ),
        {
          type: 'several',
          key: 'turns',
          label: 'May turn',
          choices: [
            { value: 'cw', label: 'clockwise (M3)' },
            { value: 'ccw', label: 'anticlockwise (M4)' },
          ],
          help: 'Seen from above, looking down on the work.',
        },
        {
          type: 'flag',
          key: 'waits',
          label: 'M3 and speed',
          yes: 'M3 waits until the spindle is at speed',
          no: 'M3 goes on at once',
          help: 'If it goes on at once a program needs a dwell after M3.',
        },
      ],
    },
    {
      type: 'group',
      key: 'drawbar',
      label: 'Power drawbar',
      optional: true,
      presence: 'it has one',
      start: { open: 1, close: 1, ejects: 0 },
      help: 'How long it takes to act; leave unticked on a machine without one.',
      fields: [
        figure('open', 'Time to open', 'seconds', 'From the code to a released holder.'),
        figure('close', 'Time to shut', 'seconds', 'From the code to a clamped holder.'),
        length('ejects', 'Pushes the holder down', 'How far opening drives the holder out.'),
      ],
    },
  ],
};

const TABLE: FactSection = {
  title: 'Table and tool change',
  fields: [
    {
      type: 'group',
      key: 'spoilboard',
      label: 'Spoilboard',
      optional: true,
      presence: 'it has one',
      start: { top: 0, allowance: 0 },
      help: 'Enter its height again after each resurfacing: a cut into the table is judged by it.',
      fields: [
        length(
          'top',
          'Height of its top',
          'Machine Z of the nose when it would just touch the board.',
        ),
        length('allowance', 'Cut into it allowed', 'How deep a through cut may go into the board.'),
        {
          type: 'group',
          key: 'area',
          label: 'Its area',
          optional: true,
          presence: 'stated; else it covers all the travel',
          start: { min: { x: 0, y: 0 }, max: { x: 0, y: 0 } },
          fields: [corner('min', 'Front left corner'), corner('max', 'Back right corner')],
        },
      ],
    },
    {
      ...maybe(
        point(
          'changePoint',
          'Change point',
          'Where M6 takes the head if the controller changes by itself or by hand. Not stated: the head stays.',
        ),
      ),
      absent: null,
    },
    figure(
      'changeSeconds',
      'Time of one change',
      'seconds',
      'Stands in the run time for every change that is not walked block by block.',
    ),
  ],
};

const BODIES: FactSection = {
  title: 'What moves and what is in the way',
  help: 'Boxes around the spindle, dust boot, beam and everything fixed inside the travel. What is not described here cannot be seen by a check.',
  fields: [
    {
      type: 'list',
      key: 'bodies',
      label: 'Moving bodies',
      entry: 'body',
      namedBy: 'name',
      start: { name: '', rides: 'head', box: { min: {}, max: {} } },
      help: 'Sides are measured from the spindle nose (head), or the Z is of the machine (carriage, gantry). Leave a side empty where the body has no end that matters.',
      fields: [
        { type: 'text', key: 'name', label: 'Name' },
        {
          type: 'choice',
          key: 'rides',
          label: 'Rides on',
          choices: [
            { value: 'head', label: 'head: follows X, Y and Z' },
            { value: 'carriage', label: 'carriage: follows X and Y' },
            { value: 'gantry', label: 'gantry: follows Y, spans X' },
          ],
        },
        maybe({
          type: 'choice',
          key: 'boot',
          label: 'If it is a dust boot',
          choices: [
            { value: 'stays', label: 'stays down during a change' },
            { value: 'lifts', label: 'lifts out of the way' },
            { value: 'docks', label: 'is put down before a change' },
          ],
          help: 'A lifted or docked boot is no obstacle.',
        } as const),
        maybe(length('bristles', 'Bristles below the box', 'They bend and are drawn only.')),
        { type: 'box', key: 'box', label: 'Box' },
      ],
    },
    {
      type: 'list',
      key: 'zones',
      label: 'Zones to keep out of',
      entry: 'zone',
      namedBy: 'name',
      start: { name: '', box: { min: {}, max: {} }, forbids: 'everything' },
      help: 'A tool setter, a pump, a fence: machine coordinates.',
      fields: [
        { type: 'text', key: 'name', label: 'Name' },
        {
          type: 'choice',
          key: 'forbids',
          label: 'Keeps out',
          choices: [
            { value: 'everything', label: 'everything' },
            { value: 'tip', label: 'the tool’s tip' },
            { value: 'rapid', label: 'rapid moves' },
            { value: 'all-but-change', label: 'everything but a tool change' },
          ],
        },
        { type: 'box', key: 'box', label: 'Box' },
      ],
    },
  ],
};

function corner(key: string, label: string): FactField {
  return {
    type: 'group',
    key,
    label,
    inline: true,
    fields: [length('x', 'X'), length('y', 'Y')],
  };
}

export const MACHINE_SECTIONS: readonly FactSection[] = [TRAVEL, MOTION, SPINDLE, TABLE, BODIES];
