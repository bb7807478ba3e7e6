import type { Path } from '../geometry/path';
import { boundsOf, boundsOfAll, type Prism } from '../geometry/prism';
import { openSpan, type Span } from '../geometry/span';
import { findBoxSpan, findSpan, isApart } from '../geometry/sweep';
import { LIMIT_SLACK } from '../geometry/tolerance';
import type { Room } from '../geometry/room';
import { regionOfMeeting, type MovingSolid, type StandingSolid } from './solids';

/** Two solids that a path of the gauge point would bring together. */
export interface Meeting {
  readonly moving: MovingSolid;
  readonly standing: StandingSolid;
  /** Where the gauge point may not be for these two. */
  readonly region: Prism;
  readonly bounds: Prism;
}
/** The worst meeting on a path. */
export interface Contact {
  readonly meeting: Meeting;
  /** How much higher the path would have to run to pass over (mm); Infinity: no height clears it. */
  readonly raise: number;
}

/** Every pair of moving and standing solids, with one box around all for the fast test. */
export interface Meetings {
  readonly bounds: Prism;
  readonly list: readonly Meeting[];
}

export function pairUp(
  moving: readonly MovingSolid[],
  standing: readonly StandingSolid[],
): Meetings {
  const list: Meeting[] = [];
  for (const still of standing) {
    for (const mover of moving) {
      const region = regionOfMeeting(still, mover);
      if (region) list.push({ moving: mover, standing: still, region, bounds: boundsOf(region) });
    }
  }
  return { bounds: boundsOfAll(list.map((each) => each.region)), list };
}

/**
 * As pairUp, where it is enough to know a box around all that stands as long as nothing comes near it: the
 * pairs are only worked out when they are looked at, and after most tool changes they never are.
 */
export function pairUpWhenNear(
  moving: readonly MovingSolid[],
  around: Prism,
  standing: () => readonly StandingSolid[],
): Meetings {
  const regions = moving.map((mover) => regionOfMeeting({ prism: around }, mover));
  let list: readonly Meeting[] | undefined;
  return {
    bounds: boundsOfAll(regions.filter((region) => region !== undefined)),
    get list() {
      return (list ??= pairUp(moving, standing()).list);
    },
  };
}

/**
 * The meeting that a path is deepest in, if there is one. `isBox`: the path is only known to lie in
 * the box of its ends. A path that begins in a region and goes straight up leaves it, which is no fault.
 */
export function worstContact(path: Path, meetings: Meetings, isBox: boolean): Contact | undefined {
  if (isApart(path, meetings.bounds)) return undefined;
  let worst: Meeting | undefined;
  let raise = -Infinity;
  const span: Span = openSpan();
  for (const meeting of meetings.list) {
    if (isApart(path, meeting.bounds)) continue;
    const { region } = meeting;
    if (!(isBox ? findBoxSpan(path, region, span) : findSpan(path, region, span))) continue;
    // The region ends the slack below a touch, and a touch clears.
    const higher = region.maxZ + LIMIT_SLACK - span.lowest;
    if (worst && !(raise < higher)) continue;
    worst = meeting;
    raise = Number.isNaN(higher) ? Infinity : higher;
  }
  if (!worst || isLifting(path)) return undefined;
  return { meeting: worst, raise };
}

/** Leaves in the rooms what certainly meets none of them; a straight lift never does, see worstContact. */
export function keepApart(
  rooms: readonly Room[],
  { bounds }: Meetings,
  { x, y, z }: { readonly x: number; readonly y: number; readonly z: number },
): void {
  for (const room of rooms) room.apartFrom(bounds, x, y, z);
}

function isLifting(path: Path): boolean {
  return (
    path.kind !== 'arc' &&
    path.fromX === path.toX &&
    path.fromY === path.toY &&
    path.fromZ <= path.toZ
  );
}
