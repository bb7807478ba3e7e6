import type { Observer } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { watchDependsOn } from './depends-on';
import { watchExtents } from './extents';
import type { Extent, Report, ToolUse, Window } from './report';
import { roundFigure, roundSeconds } from './rounding';
import { watchTimes, type Times } from './times';
import { watchToolUse } from './tool-use';
import { watchWorkZeroWindow } from './work-zero-window';

export type Summary = Pick<
  Report,
  'tools' | 'extents' | 'workZeroWindow' | 'seconds' | 'material' | 'dependsOn'
>;

/** Everything a report says beside its findings, gathered over the walk that reads `/` blocks as run. */
export function gatherSummaries(shop: Shop): {
  readonly observers: readonly Observer[];
  /** Those of them that gather from every walk: the result rests on all. */
  readonly ofEveryWalk: readonly Observer[];
  result(): Summary;
} {
  const extents = watchExtents(shop);
  const toolUse = watchToolUse(shop);
  const times = watchTimes(shop);
  const windows = watchWorkZeroWindow(shop);
  const dependsOn = watchDependsOn(shop);
  return {
    observers: [extents, toolUse, times, windows, dependsOn],
    ofEveryWalk: [dependsOn],
    result() {
      const taken = times.result();
      const { gauge, work } = extents.result();
      return {
        tools: toolUse.result(taken.cuttingByTool).map(roundUse),
        extents: {
          gauge: gauge && roundExtent(gauge),
          work: mapByName(work, roundExtent),
        },
        workZeroWindow: mapByName(windows.result(), ({ x, y, z }) => ({
          x: roundWindow(x),
          y: roundWindow(y),
          z: roundWindow(z),
        })),
        seconds: roundTimes(taken),
        // Stock is judged as a whole until what has been cut away is followed.
        material: { used: false, cell: 0, bytes: 0 },
        dependsOn: dependsOn.result(),
      };
    },
  };
}

/** Keys in the order of their names, so that a report does not depend on what came first. */
function mapByName<From, To>(
  record: Readonly<Record<string, From>>,
  map: (value: From) => To,
): Record<string, To> {
  return Object.fromEntries(
    Object.entries(record)
      .sort(([one], [other]) => (one < other ? -1 : 1))
      .map(([name, value]) => [name, map(value)]),
  );
}

function roundExtent({ min, max }: Extent): Extent {
  return {
    min: { x: roundFigure(min.x), y: roundFigure(min.y), z: roundFigure(min.z) },
    max: { x: roundFigure(max.x), y: roundFigure(max.y), z: roundFigure(max.z) },
  };
}

function roundWindow(window: Window): Window {
  return window && [roundFigure(window[0]), roundFigure(window[1])];
}

function roundUse(use: ToolUse): ToolUse {
  return {
    number: use.number,
    pocket: use.pocket,
    firstLine: use.firstLine,
    changes: use.changes,
    cutSeconds: roundSeconds(use.cutSeconds),
    cutLength: roundFigure(use.cutLength),
    lowest: use.lowest === null ? null : roundFigure(use.lowest),
  };
}

function roundTimes(times: Times): Report['seconds'] {
  return {
    total: roundSeconds(times.total),
    cutting: roundSeconds(times.cutting),
    rapid: roundSeconds(times.rapid),
    changes: roundSeconds(times.changes),
    dwell: roundSeconds(times.dwell),
  };
}
