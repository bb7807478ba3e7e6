/**
 * Thins out a polyline as its points come in, keeping no more than a handful of numbers: from the last
 * kept point it follows the cone of directions in which one straight segment passes within the
 * tolerance of every point since. Every point left out lies within the tolerance of the segment that
 * replaces it (simplify-line.spec.ts holds it against the plain definition).
 */
export interface LineSimplifier {
  push(x: number, y: number): void;
  /** Keeps the last point; the polyline is complete. */
  end(): void;
}

/** `keep` is called with each point that stays, the first and the last among them. */
export function simplifyLine(
  tolerance: number,
  keep: (x: number, y: number) => void,
): LineSimplifier {
  let isEmpty = true;
  // The last kept point, from which the cone opens, and the last point seen.
  let anchorX = 0;
  let anchorY = 0;
  let lastX = 0;
  let lastY = 0;
  // The cone as angles relative to the first direction taken; farthest: the greatest distance so far.
  let axis = 0;
  let low = -Infinity;
  let high = Infinity;
  let farthest = 0;
  let hasAxis = false;

  const restartAt = (x: number, y: number): void => {
    keep(x, y);
    anchorX = x;
    anchorY = y;
    low = -Infinity;
    high = Infinity;
    farthest = 0;
    hasAxis = false;
  };
  const take = (x: number, y: number): boolean => {
    const distance = Math.hypot(x - anchorX, y - anchorY);
    // Turning back towards the anchor would leave the farther points beyond the segment's end.
    if (distance < farthest) return false;
    farthest = distance;
    if (distance <= tolerance) return !hasAxis;
    const direction = Math.atan2(y - anchorY, x - anchorX);
    if (!hasAxis) {
      axis = direction;
      hasAxis = true;
    }
    const angle = turnBetween(axis, direction);
    if (!(low <= angle && angle <= high)) return false;
    const half = Math.asin(tolerance / distance);
    low = Math.max(low, angle - half);
    high = Math.min(high, angle + half);
    return true;
  };
  return {
    push(x, y) {
      if (isEmpty) {
        isEmpty = false;
        restartAt(x, y);
      } else if (!take(x, y)) {
        restartAt(lastX, lastY);
        take(x, y);
      }
      lastX = x;
      lastY = y;
    },
    end() {
      if (!isEmpty && (lastX !== anchorX || lastY !== anchorY)) keep(lastX, lastY);
      isEmpty = true;
    },
  };
}

/** From one direction to another, −π to π. */
function turnBetween(from: number, to: number): number {
  const turn = to - from;
  if (Math.PI < turn) return turn - 2 * Math.PI;
  if (turn < -Math.PI) return turn + 2 * Math.PI;
  return turn;
}
