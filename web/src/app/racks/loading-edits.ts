import type { Loading } from '#engine';

/** One thing a person does to the loading. Kept as acts, so that they can be put onto a newer loading. */
export type LoadingEdit =
  | { readonly act: 'load'; readonly tool: number; readonly pocket: number }
  | { readonly act: 'unload'; readonly pocket: number }
  | { readonly act: 'swap'; readonly pocket: number; readonly with: number }
  | { readonly act: 'spindle'; readonly holds: Loading['inSpindle'] }
  | { readonly act: 'by-hand'; readonly tool: number; readonly fitted: boolean }
  | { readonly act: 'go-back'; readonly revision: number; readonly to: Loading };

/** The loading after the acts, in the order they were done. */
export function applyEdits(loading: Loading, edits: readonly LoadingEdit[]): Loading {
  return edits.reduce(applyEdit, loading);
}

export function toolIn(loading: Loading, pocket: number): number | undefined {
  return loading.pockets.find((each) => each.pocket === pocket)?.tool;
}

export function pocketOf(loading: Loading, tool: number): number | undefined {
  return loading.pockets.find((each) => each.tool === tool)?.pocket;
}

function applyEdit(loading: Loading, edit: LoadingEdit): Loading {
  switch (edit.act) {
    case 'load':
      return load(loading, edit.tool, edit.pocket);
    case 'unload':
      return withPockets(
        loading,
        loading.pockets.filter((each) => each.pocket !== edit.pocket),
      );
    case 'swap':
      return swap(loading, edit.pocket, edit.with);
    case 'spindle':
      return { ...loading, inSpindle: edit.holds };
    case 'by-hand':
      return fitByHand(loading, edit.tool, edit.fitted);
    case 'go-back':
      return edit.to;
  }
}

/** A tool is in one place: putting it in a pocket takes it out of any other, and off the hand list. */
function load(loading: Loading, tool: number, pocket: number): Loading {
  const others = loading.pockets.filter((each) => each.pocket !== pocket && each.tool !== tool);
  const byHand = loading.byHand.filter((each) => each !== tool);
  return withPockets({ ...loading, byHand }, [...others, { pocket, tool }]);
}

function swap(loading: Loading, one: number, other: number): Loading {
  const place = (pocket: number) => (pocket === one ? other : pocket === other ? one : pocket);
  return withPockets(
    loading,
    loading.pockets.map((each) => ({ ...each, pocket: place(each.pocket) })),
  );
}

function fitByHand(loading: Loading, tool: number, fitted: boolean): Loading {
  const others = loading.byHand.filter((each) => each !== tool);
  if (!fitted) return { ...loading, byHand: others };
  const pockets = loading.pockets.filter((each) => each.tool !== tool);
  return { ...loading, pockets, byHand: [...others, tool].sort((a, b) => a - b) };
}

function withPockets(loading: Loading, pockets: Loading['pockets']): Loading {
  return { ...loading, pockets: pockets.toSorted((one, other) => one.pocket - other.pocket) };
}
