/** The part of a path that lies in a region: where it enters, where it last leaves, and how low it gets. */
export interface Span {
  /** 0 at the start of the path, 1 at its end. */
  enter: number;
  leave: number;
  /** Lowest z of the path between the two. */
  lowest: number;
}
export function openSpan(): Span {
  return { enter: 0, leave: 0, lowest: 0 };
}
