/** A wall seen from outside, in plan: `across` runs to the viewer's right, `depth` away from the viewer, in metres. */
export interface WallInPlan {
  from: { across: number; depth: number };
  to: { across: number; depth: number };
}

/** Metres; closer walls count as touching. */
const touchM = 1e-6;

/**
 * The order in which walls of one height are painted, so that each hides what lies behind it: far
 * ones first. Straight lines seen from one direction can always be put in order as long as they
 * don't cross (the view never runs in a circle in the plane); those that cross are to be split at
 * the crossing first.
 *
 * @returns indexes into `walls`
 */
export function orderWalls(walls: readonly WallInPlan[]): number[] {
  /** By wall: those that must be painted before it. */
  const behind = walls.map((front, index) =>
    walls.flatMap((other, otherIndex) =>
      index !== otherIndex && isBehind(other, front) ? [otherIndex] : [],
    ),
  );
  const order: number[] = [];
  const visited = new Set<number>();
  const visit = (index: number) => {
    if (visited.has(index)) return;
    visited.add(index);
    for (const earlier of behind[index] ?? []) visit(earlier);
    order.push(index);
  };
  // Starting from the farthest keeps the order stable where walls don't hide each other.
  const byDepth = walls
    .map((wall, index) => ({ index, depth: (wall.from.depth + wall.to.depth) / 2 }))
    .sort((a, b) => b.depth - a.depth || a.index - b.index);
  for (const { index } of byDepth) visit(index);
  return order;
}

/** Splits walls where they cross one another in plan. */
export function splitAtCrossings<Wall extends WallInPlan>(walls: readonly Wall[]): Wall[] {
  return walls.flatMap((wall) => {
    const shares = walls
      .flatMap((other) => {
        const share = crossingShare(wall, other);
        return share === null ? [] : [share];
      })
      .sort((a, b) => a - b);
    const stops = [0, ...shares, 1];
    return stops.slice(1).flatMap((end, index) => {
      const start = stops[index] ?? 0;
      return end - start < 1e-9
        ? []
        : [{ ...wall, from: pointAt(wall, start), to: pointAt(wall, end) }];
    });
  });
}

function isBehind(a: WallInPlan, b: WallInPlan): boolean {
  const start = Math.max(
    Math.min(a.from.across, a.to.across),
    Math.min(b.from.across, b.to.across),
  );
  const end = Math.min(Math.max(a.from.across, a.to.across), Math.max(b.from.across, b.to.across));
  if (end - start < touchM) return false;
  const middle = (start + end) / 2;
  return depthAt(a, middle) > depthAt(b, middle) + touchM;
}

function depthAt({ from, to }: WallInPlan, across: number): number {
  const share = (across - from.across) / (to.across - from.across);
  return from.depth + share * (to.depth - from.depth);
}

function pointAt({ from, to }: WallInPlan, share: number): { across: number; depth: number } {
  return {
    across: from.across + share * (to.across - from.across),
    depth: from.depth + share * (to.depth - from.depth),
  };
}

/** How far along `wall` it is crossed by `other`, strictly inside both; null where they don't cross. */
function crossingShare(wall: WallInPlan, other: WallInPlan): number | null {
  const a = [wall.to.across - wall.from.across, wall.to.depth - wall.from.depth] as const;
  const b = [other.to.across - other.from.across, other.to.depth - other.from.depth] as const;
  const denominator = a[0] * b[1] - a[1] * b[0];
  if (Math.abs(denominator) < 1e-12) return null;
  const offset = [
    other.from.across - wall.from.across,
    other.from.depth - wall.from.depth,
  ] as const;
  const share = (offset[0] * b[1] - offset[1] * b[0]) / denominator;
  const otherShare = (offset[0] * a[1] - offset[1] * a[0]) / denominator;
  const isInside = (value: number) => value > 1e-9 && value < 1 - 1e-9;
  return isInside(share) && isInside(otherShare) ? share : null;
}
