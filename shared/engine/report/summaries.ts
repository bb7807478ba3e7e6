import type { Observer } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import type { Report } from './report';

export type Summary = Pick<
  Report,
  'tools' | 'extents' | 'workZeroWindow' | 'seconds' | 'material' | 'dependsOn'
>;

/** Everything a report says beside its findings, gathered over the walk that reads `/` blocks as run. */
export function gatherSummaries(_shop: Shop): {
  readonly observers: readonly Observer[];
  result(): Summary;
} {
  return {
    observers: [],
    result: () => ({
      tools: [],
      extents: { gauge: null, work: {} },
      workZeroWindow: {},
      seconds: { total: 0, cutting: 0, rapid: 0, changes: 0, dwell: 0 },
      material: { used: false, cell: 0, bytes: 0 },
      dependsOn: { tools: [], pockets: [], offsets: [], pairs: [] },
    }),
  };
}
