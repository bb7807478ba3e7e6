import type { Path } from '../geometry/path';
import { boundsOf, cylinderPrism, meetingRegion, type Prism } from '../geometry/prism';
import { type Span } from '../geometry/span';
import { findBoxSpan, findSpan, isApart } from '../geometry/sweep';
import { distanceFrom } from '../geometry/sweep-arc';
import { LIMIT_SLACK } from '../geometry/tolerance';
import type { Room } from '../geometry/room';
import type { Tool } from './setup';
import type { Shop } from './shop';
import {
  openWorkFrames,
  tipDrop,
  type Place3,
  type WorkFrames,
  type WorkPlace,
} from './work-frames';

/**
 * The stock as the job sheet gives it, whole: what has been cut away is not known here. Without a job
 * sheet everything under Z zero counts as stock, where zero is on its top; with zero on the board
 * nothing is known of it.
 */
export class Material {
  /** Whether the job sheet says where the stock lies. */
  readonly isStated: boolean;
  private readonly frames: WorkFrames;
  private region: Prism | undefined;
  private bounds: Prism | undefined;
  private tool: Tool | undefined;
  private workOffset = '';
  private originX: number | undefined;
  private originY: number | undefined;
  private originZ: number | undefined;
  private lengthOffset = NaN;
  private isPlaced = false;

  constructor(private readonly shop: Shop) {
    this.isStated = shop.setup.job?.stock !== undefined;
    this.frames = openWorkFrames(shop);
  }

  /** Where the gauge point may not be if the held tool is to stay out of the stock. */
  regionFor(now: WorkPlace): Prism | undefined {
    if (
      !this.isPlaced ||
      this.tool !== now.held.tool ||
      this.originZ !== now.originZ ||
      this.originX !== now.originX ||
      this.originY !== now.originY ||
      this.lengthOffset !== now.lengthOffset ||
      this.workOffset !== now.workOffset
    ) {
      this.place(now);
    }
    return this.region;
  }

  /**
   * Leaves in the room what is certainly clear of the stock, or in it by no more than `depth` (mm) with the
   * tip: beside it where the head stands beside it now, above it otherwise.
   */
  keepClear(room: Room, now: WorkPlace & Place3, depth = 0): void {
    const region = this.regionFor(now);
    if (!region || !this.bounds) return;
    const { minX, minY, maxX, maxY } = this.bounds;
    const isBeside = now.x < minX || maxX < now.x || now.y < minY || maxY < now.y;
    if (isBeside && depth === 0) room.apartFrom(this.bounds, now.x, now.y, now.z);
    else room.above(region.maxZ - depth);
  }

  /** Whether the tool meets stock on this path; `span` then says where. */
  isMet(path: Path, now: WorkPlace, span: Span): boolean {
    const region = this.regionFor(now);
    if (!region || !this.bounds || isApart(path, this.bounds)) return false;
    return findSpan(path, region, span);
  }

  /** Whether the tool is in the stock with the gauge point at this place. */
  isMetAt(x: number, y: number, z: number, now: WorkPlace): boolean {
    const region = this.regionFor(now);
    return region !== undefined && distanceFrom(region, { x, y, z }) <= 0;
  }

  /** As isMet, for a path only known to lie in the box of its ends. */
  isMetByBox(path: Path, now: WorkPlace, span: Span): boolean {
    const region = this.regionFor(now);
    return region !== undefined && findBoxSpan(path, region, span);
  }

  /** How deep the tip is under the top of the stock when the gauge point is at this height (mm). */
  depthAt(gaugeZ: number, now: WorkPlace): number {
    const region = this.regionFor(now);
    return region ? region.maxZ + LIMIT_SLACK - gaugeZ : -Infinity;
  }

  /** Whether a physical X and Y lie over the stock. */
  isOver(x: number, y: number, now: WorkPlace): boolean {
    const stock = this.shop.setup.job?.stock;
    if (!stock) return true;
    const origin = this.frames.origin(stock.in, now);
    return (
      origin.x + stock.min.x <= x &&
      x <= origin.x + stock.max.x &&
      origin.y + stock.min.y <= y &&
      y <= origin.y + stock.max.y
    );
  }

  private place(now: WorkPlace): void {
    this.isPlaced = true;
    this.tool = now.held.tool;
    this.workOffset = now.workOffset;
    this.originX = now.originX;
    this.originY = now.originY;
    this.originZ = now.originZ;
    this.lengthOffset = now.lengthOffset;
    this.region = this.placed(now);
    this.bounds = this.region ? boundsOf(this.region) : undefined;
  }

  private placed(now: WorkPlace): Prism | undefined {
    const { job } = this.shop.setup;
    // Zero that is not set yet puts the stock nowhere; that it is not set is a finding of its own.
    if (!this.frames.isSet(job?.stock?.in ?? now.workOffset, now)) return undefined;
    if (!this.frames.isSet(now.workOffset, now)) return undefined;
    const tip = cylinderPrism({ x: 0, y: 0 }, (now.held.tool?.diameter ?? 0) / 2, [
      -tipDrop(now),
      Infinity,
    ]);
    if (job?.stock) {
      const { stock } = job;
      return meetingRegion(stockPrism(stock, this.frames.origin(stock.in, now)), tip);
    }
    if (job?.zeroOn === 'board') return undefined;
    const origin = this.frames.origin(now.workOffset, now);
    return meetingRegion({ ...ALL, maxZ: origin.z }, tip);
  }
}

const ALL: Prism = {
  minX: -Infinity,
  minY: -Infinity,
  minZ: -Infinity,
  maxX: Infinity,
  maxY: Infinity,
  maxZ: Infinity,
  round: 0,
};

function stockPrism(stock: { readonly min: Place3; readonly max: Place3 }, origin: Place3): Prism {
  return {
    minX: origin.x + stock.min.x,
    minY: origin.y + stock.min.y,
    minZ: origin.z + stock.min.z,
    maxX: origin.x + stock.max.x,
    maxY: origin.y + stock.max.y,
    maxZ: origin.z + stock.max.z,
    round: 0,
  };
}
