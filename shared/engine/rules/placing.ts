import type { MachineState, Motion } from '../interpreter/events';

/** Which axes a program coordinate places by a work offset that has no value. */
export function unsetAxes(
  motion: Motion,
  state: MachineState,
): { readonly x: boolean; readonly y: boolean; readonly z: boolean } {
  if (motion.by === 'machine' || isAllSet(state)) return NONE_UNSET;
  return {
    x: state.originX === undefined,
    y: state.originY === undefined,
    z: state.originZ === undefined,
  };
}
const NONE_UNSET = { x: false, y: false, z: false };

/** Whether it is known where in the machine the motion runs. */
export function isPlaced(motion: Motion, state: MachineState): boolean {
  return motion.by === 'machine' || isAllSet(state);
}

function isAllSet(state: MachineState): boolean {
  return state.originX !== undefined && state.originY !== undefined && state.originZ !== undefined;
}

/** The axis words that make the motion. */
export function movedWords(motion: Motion): { letters: string } {
  const isArc = motion.kind === 'arc';
  const x = isArc || motion.fromX !== motion.toX ? 'X' : '';
  const y = isArc || motion.fromY !== motion.toY ? 'Y' : '';
  const z = motion.fromZ !== motion.toZ ? 'Z' : '';
  return { letters: x + y + z || 'block' };
}
