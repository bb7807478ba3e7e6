import type { FindingData } from '../report/report';
import type { Shop } from '../shop/shop';
import type { Tool } from '../shop/setup';
import { figure, text, toolWords } from './finding-data';
import { defineRule } from './rule';
import { classesAgree, classOfKind } from './tool-comment';
import { meaningsInMm, watchToolComments, type PlacedToolComment } from './watch-tool-comments';

/** A comment says one thing of a tool, the tool list another. */
export const toolCommentDisagrees = defineRule({
  id: 'tool-comment-disagrees',
  group: 'tools',
  title: 'A comment and the tool list disagree about a tool',
  severity: 'hold',
  hold: 'judge',
  protects: 'The part from another cutter than the one it was programmed for.',
  explanation:
    'Posts write a tool list into the head of a program, and people write a remark into the block of the change. The diameter (more than 0.05 mm apart), the kind of cutter and the number are held against the tool list. Tapered and pointed cutters have several diameters and are left out, as is every remark that can be read in two ways. Which of the two is true, the check cannot say.',
  examples: {
    bad: '(T2  D=6.35 CR=0. - ZMIN=-5 - FLAT END MILL)\nG21 G90 G54\nT2 M6\nG0 X0\nM30',
    good: '(T2  D=6. CR=0. - ZMIN=-5 - FLAT END MILL)\nG21 G90 G54\nT2 M6\nG0 X0\nM30',
  },
  word: (data, lengths) => ({
    message: describe(data, lengths.length),
    advice: 'Find out which of the two is true, and correct the tool list or the program.',
  }),
  observe: (shop, report) =>
    watchToolComments((comment, state) => {
      for (const { tool, what, data } of disagreements(shop, comment)) {
        const all = { what, tool, ...data };
        report.found({ cause: `T${tool} ${what}`, at: comment.place, tool, data: all }, state);
      }
    }),
});

/** Diameters agree within this (mm): rules.md. Two shanks that are mistaken for each other differ by 0.06 and more. */
const SAME_DIAMETER = 0.05;
const ROUNDING = 1e-9;

interface Disagreement {
  readonly tool: number;
  readonly what: string;
  readonly data: FindingData;
}

function* disagreements(shop: Shop, comment: PlacedToolComment): Generator<Disagreement> {
  const { about, called, kind } = comment;
  if (called !== undefined && comment.tool !== undefined && called !== comment.tool) {
    yield { what: 'number', tool: called, data: { written: comment.tool } };
    return;
  }
  const tool = shop.toolByNumber.get(about);
  if (!tool) return;
  const listed = classOfKind(tool.kind);
  const isPointed = comment.isTapered || listed === 'v';
  if (!isPointed && comment.diameter !== undefined && !sameDiameter(tool, comment)) {
    const mm = meaningsInMm(comment)[0]!;
    const data = { name: tool.name, written: mm, listed: tool.diameter };
    yield { what: 'diameter', tool: about, data };
  }
  if (kind && listed && !classesAgree(kind, listed)) {
    const data = { name: tool.name, written: kind, listed: tool.kind };
    yield { what: 'kind', tool: about, data };
  }
}

/**
 * Without a unit of its own the size may also fit in the other unit: that is a fault of the units, and
 * said there. A cutter may be described by what it was ground to.
 */
function sameDiameter(tool: Tool, comment: PlacedToolComment): boolean {
  const { diameter = NaN, unit } = comment;
  const meanings = unit ? meaningsInMm(comment) : [diameter, diameter * MM_PER_INCH];
  return meanings.some((mm) =>
    [tool.diameter, tool.asGround ?? tool.diameter].some(
      (own) => Math.abs(mm - own) <= SAME_DIAMETER + ROUNDING,
    ),
  );
}
const MM_PER_INCH = 25.4;

function describe(data: Parameters<typeof text>[0], length: (mm: number) => string): string {
  switch (text(data, 'what')) {
    case 'number':
      return `The comment in this block speaks of T${figure(data, 'written')}, but the block calls T${figure(data, 'tool')}.`;
    case 'kind':
      return `The comment calls ${toolWords(data)} ${kindWords(text(data, 'written'))}, but the tool list says ${text(data, 'listed')}.`;
    default:
      return `The comment gives ${toolWords(data)} a diameter of ${length(figure(data, 'written'))}, but the tool list says ${length(figure(data, 'listed'))}.`;
  }
}

function kindWords(kind: string): string {
  const words: Readonly<Record<string, string>> = {
    end: 'an end mill',
    ball: 'a ball cutter',
    drill: 'a drill',
    v: 'a V cutter',
    face: 'a surfacing cutter',
    saw: 'a saw',
    probe: 'a probe',
    knife: 'a knife',
  };
  return words[kind] ?? kind;
}
