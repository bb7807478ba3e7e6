import { isBounds, type Value } from '../expressions/value';
import { parameterKey, showParameter, type ParameterKey } from '../parameters/parameter-name';
import { ParameterStore, unknownValue, type LiveParameter } from '../parameters/parameter-store';
import type { Grammar } from '../expressions/grammar';
import { hold } from './held-tool';
import type { ProbeResult } from './kept';
import type { Run } from './run';
import { wholeNumber } from './whole-number';
import { AXES, offsetName, type AxisName } from './work-offsets';

/** What the parameters of the published language are read off. */
type Read = Pick<Run, 'shop' | 'controller' | 'machine' | 'offsets' | 'references' | 'probed'>;

/** Facts sheet 4.3: where the parameters of each axis begin. */
const PROBED = 5_061;
const HOME = { g28: 5_161, g30: 5_181 } as const;
const PRESET = 5_211;
const ACTIVE_OFFSET = 5_220;
const FIRST_ORIGIN = 5_221;
const ORIGIN_STEP = 20;
const OFFSETS = 9;
/** Whether the last probing touched; common practice, no source. */
const PROBE_TOUCHED = 5_070;

/** The parameters of a walk, with the setup's starting values in place. */
export function openParameters(read: Read, grammar: Grammar): ParameterStore {
  const stated = new Map<ParameterKey, number | undefined>();
  for (const { into } of read.controller.codes)
    if (into !== undefined) stated.set(parameterKey(into), undefined);
  const live = liveParameters(read, grammar);
  const declared = declaredParameters(read);
  for (const [name, value] of Object.entries(read.controller.parameters)) {
    const key = parameterKey(name);
    // A stated starting value wins over references and work offsets, not over what the spindle holds.
    if (live.has(key)) live.get(key)!.write?.(value);
    else stated.set(key, value);
  }
  read.offsets.settle(read.machine.workOffset);
  return new ParameterStore(grammar, new Map([...live, ...declared]), stated);
}

function liveParameters(read: Read, { isMacro }: Grammar): Map<ParameterKey, LiveParameter> {
  const live = new Map<ParameterKey, LiveParameter>();
  // A macro dialect numbers its system variables in a way of its own (facts sheet 12.1.1).
  if (isMacro) return live;
  const { machine, offsets, probed } = read;
  const first: Partial<Record<AxisName, number>> = {};
  const second: Partial<Record<AxisName, number>> = {};
  AXES.forEach((axis, index) => {
    live.set(PROBED + index, { read: () => probed[axis] });
    live.set(HOME.g28 + index, referenceAxis(read, 'g28', axis, HOME.g28 + index, first));
    live.set(HOME.g30 + index, referenceAxis(read, 'g30', axis, HOME.g30 + index, second));
    const unit = storedUnit(read, axis);
    live.set(PRESET + index, {
      read: () => offsets.presetKept[axis] / unit,
      write(value) {
        if (isBounds(value)) return 'unknown';
        offsets.presetKept[axis] = (value ?? 0) * unit;
        offsets.presetAxesKept |= (1 << index) & 7;
        return undefined;
      },
    });
    for (let number = 1; number <= OFFSETS; number++) {
      const parameter = FIRST_ORIGIN + (number - 1) * ORIGIN_STEP + index;
      live.set(parameter, originAxis(read, offsetName(number)!, axis, parameter));
    }
  });
  live.set(PROBE_TOUCHED, { read: () => probed.touched });
  live.set(ACTIVE_OFFSET, { read: () => offsetNumber(machine.workOffset) });
  return live;
}

/** Stored lengths are in the setup's unit throughout: the published language converts none of them (4.12). */
const storedUnit = ({ controller }: Read, axis: AxisName): number =>
  controller.defaults.units === 'inch' && axis !== 'a' ? 25.4 : 1;

function originAxis(read: Read, name: string, axis: AxisName, parameter: number): LiveParameter {
  const { machine, offsets } = read;
  const unit = storedUnit(read, axis);
  return {
    read() {
      const mm = offsets.assigned(name, axis);
      return mm === undefined ? unknownValue(parameter) : mm / unit;
    },
    write(value) {
      if (isBounds(value)) return 'unknown';
      offsets.assign(name, axis, (value ?? 0) * unit, name === machine.workOffset);
      return undefined;
    },
  };
}

function referenceAxis(
  read: Read,
  code: 'g28' | 'g30',
  axis: AxisName,
  parameter: number,
  stored: Partial<Record<AxisName, number>>,
): LiveParameter {
  const unit = storedUnit(read, axis);
  const { references } = read;
  return {
    read() {
      const mm = references[code]?.[axis] ?? stored[axis] ?? (axis === 'a' ? 0 : undefined);
      return mm === undefined ? unknownValue(parameter) : mm / unit;
    },
    write(value) {
      if (isBounds(value)) return 'unknown';
      stored[axis] = (value ?? 0) * unit;
      const { x, y, z, a } = Object.assign(stored, references[code], { [axis]: stored[axis] });
      // A stored point is one once all of it is known.
      if (x !== undefined && y !== undefined && z !== undefined)
        references[code] = { x, y, z, a: a ?? 0 };
      return undefined;
    },
  };
}

function offsetNumber(name: string): Value {
  for (let number = 1; number <= OFFSETS; number++) if (offsetName(number) === name) return number;
  return unknownValue(ACTIVE_OFFSET);
}

/** Parameters that the setup says hold tools, pockets and inputs. */
function declaredParameters(read: Read): Map<ParameterKey, LiveParameter> {
  const { controller, machine, shop } = read;
  const live = new Map<ParameterKey, LiveParameter>();
  const put = (
    name: string | undefined,
    worth: (key: ParameterKey) => Value,
    write?: LiveParameter['write'],
  ) => {
    if (name === undefined) return;
    const key = parameterKey(name);
    live.set(key, { read: () => worth(key), ...(write ? { write } : {}) });
  };
  const tools = [0, ...shop.toolByNumber.keys()];
  const anyTool = (key: ParameterKey): Value => within(tools, key);
  const anyPocket = (key: ParameterKey): Value => within([0, ...shop.pocketByNumber.keys()], key);
  // A program that sets it tells the controller what the spindle holds; nothing moves.
  put(
    controller.currentTool,
    (key) => (machine.held.known ? machine.held.number : anyTool(key)),
    (value) => {
      if (isBounds(value)) return 'unknown';
      const number = wholeNumber(value ?? 0);
      hold(read, number >= 0 ? number : null);
      return undefined;
    },
  );
  put(
    controller.selectedTool,
    (key) => machine.selectedTool ?? anyTool(key),
    (value) => {
      if (isBounds(value)) return 'unknown';
      const number = wholeNumber(value ?? 0);
      machine.selectedTool = number >= 0 ? number : null;
      return undefined;
    },
  );
  put(controller.currentPocket, (key) => {
    const { known, number } = machine.held;
    return known && number !== null ? pocketOf(read, number) : anyPocket(key);
  });
  put(controller.selectedPocket, (key) => {
    const { selectedTool } = machine;
    if (selectedTool === null) return anyPocket(key);
    return controller.toolWord === 'pocket' ? selectedTool : pocketOf(read, selectedTool);
  });
  const contents = new Map<string, Value>();
  for (const [pocket, name] of Object.entries(controller.pocketContents))
    put(
      name,
      () => contents.get(pocket) ?? shop.toolOfPocket.get(Number(pocket)) ?? 0,
      (value) => void contents.set(pocket, value),
    );
  for (const { parameter, when } of controller.inputs)
    put(parameter, (key) => within([0, 1, when], key));
  return live;
}

const pocketOf = ({ shop }: Read, tool: number): number => shop.pocketsOfTool.get(tool)?.[0] ?? 0;

function within(values: readonly number[], key: ParameterKey): Value {
  return { least: Math.min(...values), greatest: Math.max(...values), of: showParameter(key) };
}

/** Before anything has been probed in this program. */
export const notProbed = (): ProbeResult => ({
  x: unknownValue(PROBED),
  y: unknownValue(PROBED + 1),
  z: unknownValue(PROBED + 2),
  a: unknownValue(PROBED + 3),
  touched: unknownValue(PROBE_TOUCHED),
});
