import type { Loading, Tool } from '#engine';
import { pocketOf } from './loading-edits';
import type { LoadingEdit } from './loading-edits';

type Names = ReadonlyMap<number, Pick<Tool, 'name'>>;

/** "T4 (6 mm compression)", or "T4" for a number that is not in the tool list. */
export function wordTool(number: number, tools: Names): string {
  const tool = tools.get(number);
  return tool ? `T${number} (${tool.name})` : `T${number}`;
}

export function wordSpindle(holds: Loading['inSpindle']): string {
  if (holds === null) return 'nothing';
  return holds === 'unknown' ? 'something unknown' : `T${holds}`;
}

/** A pending act in a sentence, as it reads in the list of unsaved changes. */
export function wordEdit(edit: LoadingEdit, before: Loading, tools: Names): string {
  switch (edit.act) {
    case 'load': {
      const from = pocketOf(before, edit.tool);
      const whence = from === undefined || from === edit.pocket ? '' : ` from pocket ${from}`;
      const there = before.pockets.find((each) => each.pocket === edit.pocket)?.tool;
      const instead = there === undefined || there === edit.tool ? '' : `; T${there} comes out`;
      return `${wordTool(edit.tool, tools)} goes${whence} into pocket ${edit.pocket}${instead}.`;
    }
    case 'unload':
      return `Pocket ${edit.pocket} is emptied.`;
    case 'swap':
      return `Pockets ${edit.pocket} and ${edit.with} change their tools.`;
    case 'spindle':
      return `The spindle holds ${wordSpindle(edit.holds)}.`;
    case 'by-hand':
      return edit.fitted
        ? `${wordTool(edit.tool, tools)} is fitted by hand when called.`
        : `${wordTool(edit.tool, tools)} is no longer fitted by hand.`;
    case 'go-back':
      return `Everything goes back to loading ${edit.revision}.`;
  }
}

/** What changed between two loadings, tool by tool, then the spindle, then tools fitted by hand. */
export function wordDifferences(was: Loading, is: Loading, tools: Names): readonly string[] {
  return [
    ...wordMoves(was, is, tools),
    ...(was.inSpindle === is.inSpindle
      ? []
      : [`The spindle holds ${wordSpindle(is.inSpindle)}; before: ${wordSpindle(was.inSpindle)}.`]),
    ...is.byHand
      .filter((tool) => !was.byHand.includes(tool))
      .map((tool) => `${wordTool(tool, tools)} is fitted by hand when called.`),
    ...was.byHand
      .filter((tool) => !is.byHand.includes(tool))
      .map((tool) => `${wordTool(tool, tools)} is no longer fitted by hand.`),
  ];
}

/** Places are compared one by one, so that a tool that wrongly stands in two pockets shows too. */
function wordMoves(was: Loading, is: Loading, tools: Names): readonly string[] {
  const numbers = [...new Set([...was.pockets, ...is.pockets].map((each) => each.tool))];
  return numbers
    .sort((one, other) => one - other)
    .flatMap((tool) => {
      const left = placesOf(was, tool).filter((each) => !placesOf(is, tool).includes(each));
      const come = placesOf(is, tool).filter((each) => !placesOf(was, tool).includes(each));
      if (left.length === 0 && come.length === 0) return [];
      const name = wordTool(tool, tools);
      if (come.length === 0) return [`${name} came out of ${wordPockets(left)}.`];
      const whence = left.length === 0 ? '' : ` from ${wordPockets(left)}`;
      return [`${name} went${whence} into ${wordPockets(come)}.`];
    });
}

function placesOf(loading: Loading, tool: number): readonly number[] {
  return loading.pockets.filter((each) => each.tool === tool).map((each) => each.pocket);
}

function wordPockets(pockets: readonly number[]): string {
  return pockets.length === 1 ? `pocket ${pockets[0]}` : `pockets ${pockets.join(' and ')}`;
}
