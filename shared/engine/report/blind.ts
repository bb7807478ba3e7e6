import type { Setup } from '../shop/setup';

/** What no reading of a program can see; each names the person's check that stands in for it. */
const ALWAYS = [
  'Not seen: dirt or chips in the taper or on the holder. Wipe and look before the run.',
  'Not seen: a worn or bent fork, or a holder not fully home in it. Look along the rack and push each holder in.',
  'Not seen: whether the cutter in each holder is the one the tool list describes, sharp and whole. Compare each with the list.',
  'Not seen: a loose collet or nut. Tighten to the torque its maker gives.',
  'Not seen: a clamp, pod or sheet that is not where the job sheet says, warped or thicker stock. Look at the table and measure the stock.',
  'Not seen: loss of vacuum, air or dust extraction during the run. Read the gauges before the start.',
  'Not seen: an axis that is not homed or has lost its position. Home the machine, and again after any fault.',
  'Not seen: a controller, rack or macro that differs from its description here. Prove each change on the machine.',
];
const RAPIDS =
  'Not seen: the path of a rapid in detail, since each axis runs at its own speed on this machine; it is only known to lie in the box of its two ends.';
const CHANGE =
  'Not seen: the path of the tool change itself, which the controller makes on its own.';
const BY_HAND = 'Not seen: what a person does at the machine when a tool is changed by hand.';
const STOCK =
  'Not seen: where the stock lies, because the job sheet does not say; what needs it is judged by work zero on the top of the stock.';

const BETWEEN =
  'Not seen: what stands between the bounds of a place that is only known within them before the run, such as where a probe stops; motion there is judged from and to its bounds.';

/** Whole sentences for every report; the setup and the program decide which of the last ones apply. */
export function blindSentences(setup: Setup, movesAtBounds = false): readonly string[] {
  const sentences = [...ALWAYS];
  if (setup.controller.rapids === 'independent') sentences.push(RAPIDS);
  if (setup.controller.toolChange === 'controller') sentences.push(CHANGE);
  if (setup.controller.toolChange === 'manual') sentences.push(BY_HAND);
  if (!setup.job?.stock) sentences.push(STOCK);
  if (movesAtBounds) sentences.push(BETWEEN);
  return sentences;
}
