/**
 * Reads what posts and people write about a tool in comments. Only plain cases are taken: what could be
 * read in two ways is not read at all, because a false alarm costs more than a missed remark.
 */
export interface ToolComment {
  /** The tool number named; undefined when the comment names none. */
  readonly tool: number | undefined;
  /** As written, before any unit is applied. */
  readonly diameter: number | undefined;
  /** Present only when written with the diameter; otherwise the program's unit is meant. */
  readonly unit: 'mm' | 'inch' | undefined;
  readonly kind: ToolClass | undefined;
  /** Whether the cutter is tapered or pointed, so that its diameter may be any of several. */
  readonly isTapered: boolean;
}
/** Kinds of cutter that a comment and a tool list can contradict each other about. */
export type ToolClass = 'end' | 'ball' | 'drill' | 'v' | 'face' | 'saw' | 'probe' | 'knife';

const NUMBERED =
  /^\s*(?:T|TOOL(?:\s*(?:NO|NUMBER|NUM)\b\.?)?\s*[-:#=]?\s*T?)\s*(\d{1,5})(?:\.0*)?(?![\d.])/i;
const NUMBER = String.raw`(\d+[ -]\d+\/\d+|\d+\/\d+|\d+[.,]?\d*|[.,]\d+)`;
const UNIT = String.raw`\s*(mm\b|inch(?:es)?\b|in\b\.?|"|″|'')?`;
const NAMED_DIAMETER = new RegExp(
  String.raw`(?:\bD\s*=|\bdia(?:meter)?\b\.?\s*[-=:]?|Ø)\s*${NUMBER}${UNIT}`,
  'i',
);
const LEADING_MEASURE = new RegExp(String.raw`^[\s:=,|-]*${NUMBER}${UNIT}(.*)$`, 'i');
/** What a length in front of these words measures is not the cutter. */
const OTHER_LENGTH =
  /^\W*(?:x\b|×|deep|depth|thick|long|length|radius|rad\b|stock|shank|collet|doc\b|loc\b|flute length|step|stick|hole|pitch)/i;

/** What the comment says of a tool, or undefined when it says nothing that can be held against the list. */
export function readToolComment(comment: string): ToolComment | undefined {
  const numbered = NUMBERED.exec(comment);
  const said = numbered ? comment.slice(numbered[0].length) : comment;
  const measure = readDiameter(said);
  const kind = measure ? readClass(said) : undefined;
  // Without a number, a bare '18 mm' may be anything: stock, depth, a distance.
  if (!numbered && !(measure && (kind || NAMED_DIAMETER.test(said)))) return undefined;
  return {
    tool: numbered ? Number(numbered[1]) : undefined,
    diameter: measure?.diameter,
    unit: measure?.unit,
    kind,
    isTapered: isTapered(said, kind),
  };
}

function readDiameter(
  said: string,
): { readonly diameter: number; readonly unit: ToolComment['unit'] } | undefined {
  // 'D=1 H=1' names offset numbers, not sizes.
  const named = /\bH\s*=/i.test(said) ? null : NAMED_DIAMETER.exec(said);
  if (named) return measured(named[1]!, named[2]);
  const leading = LEADING_MEASURE.exec(said);
  if (!leading?.[2] || OTHER_LENGTH.test(leading[3]!)) return undefined;
  return measured(leading[1]!, leading[2]);
}

function measured(number: string, unit: string | undefined) {
  const diameter = valueOf(number);
  if (!(diameter > 0)) return undefined;
  if (unit === undefined) return { diameter, unit: undefined };
  return { diameter, unit: /mm/i.test(unit) ? ('mm' as const) : ('inch' as const) };
}

function valueOf(number: string): number {
  const fraction = /^(?:(\d+)[ -])?(\d+)\/(\d+)$/.exec(number);
  if (fraction) return Number(fraction[1] ?? 0) + Number(fraction[2]) / Number(fraction[3]);
  return Number(number.replace(',', '.'));
}

/** Words for each class; 'ball end mill' is a ball, 'slot drill' an end mill, so they stand first. */
const CLASS_WORDS: readonly (readonly [ToolClass, RegExp])[] = [
  ['ball', /\bball\b|ballnose/i],
  ['end', /end[ -]?mills?\b|\bslot[ -]drill\b|compression|up-?cut|down-?cut|\bstraight bit\b/i],
  [
    'drill',
    /(?<!slot[ -]|spot[ -]|cent(?:er|re)[ -]|spot|center|centre)\bdrill\b(?!\s*(?:holes?|all|the|cycle|\d))/i,
  ],
  ['v', /\bv-?bit\b|\bv-?carve\b|\bv-?groove\b|engrav/i],
  ['face', /\bface[ -]?mill\b|surfacing|fly[ -]?cutter/i],
  ['saw', /\bsaw\b/i],
  ['probe', /\bprobe\b/i],
  ['knife', /\bknife\b/i],
];
/** Cutters that go by several names, or by the name of another: nothing is concluded from these. */
const UNSURE =
  /chamfer|spot|cent(?:er|re)|countersink|counterbore|taper(?!\s*=)|thread|\btap\b|ream|form\b|dovetail|t-?slot|bull|lollipop|bor(?:e|ing)\b/i;

function readClass(said: string): ToolClass | undefined {
  if (UNSURE.test(said)) return undefined;
  const classes = CLASS_WORDS.filter(([, words]) => words.test(said)).map(([name]) => name);
  if (classes.length === 2 && classes[0] === 'ball' && classes[1] === 'end') return 'ball';
  if (classes.length === 2 && /\bslot[ -]drill\b/i.test(said)) return 'end';
  return classes.length === 1 ? classes[0] : undefined;
}

/** A drill's TAPER= is its point angle, which leaves its diameter plain. */
function isTapered(said: string, kind: ToolClass | undefined): boolean {
  if (kind === 'v') return true;
  if (/chamfer|countersink|taper(?!\s*=)|cone|conical|engrav|dovetail|spot|\bv\b/i.test(said))
    return true;
  return /taper\s*=/i.test(said) && kind !== 'drill' && !/drill/i.test(said);
}

/** The class of a kind in the tool list; undefined for kinds nothing can be said about. */
export function classOfKind(kind: string): ToolClass | undefined {
  switch (kind.trim().toLowerCase()) {
    case 'compression':
    case 'end-mill':
    case 'upcut':
    case 'downcut':
      return 'end';
    case 'ball':
      return 'ball';
    case 'drill':
      return 'drill';
    case 'v-bit':
      return 'v';
    case 'surfacing':
      return 'face';
    case 'saw':
      return 'saw';
    case 'probe':
      return 'probe';
    case 'knife':
      return 'knife';
    default:
      return undefined;
  }
}

/** Facing is often done with a plain large cutter, so these two do not contradict each other. */
export function classesAgree(one: ToolClass, other: ToolClass): boolean {
  return (
    one === other || (one === 'face' && other === 'end') || (one === 'end' && other === 'face')
  );
}
