import type { SheetPoint, SheetRing } from './frame.ts';

/** A rectangle on the sheet, from its upper left corner. */
export interface LabelBox {
  x: number;
  y: number;
  width: number;
  height: number;
}

export function boxesMeet(a: LabelBox, b: LabelBox): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** The box around all points of some rings. */
export function boxAround(rings: readonly SheetRing[]): LabelBox {
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const [x, y] of rings.flat()) {
    left = Math.min(left, x);
    right = Math.max(right, x);
    top = Math.min(top, y);
    bottom = Math.max(bottom, y);
  }
  return { x: left, y: top, width: right - left, height: bottom - top };
}

/** Whether a point lies inside rings, by the even-odd rule. */
export function isInside([x, y]: SheetPoint, rings: readonly SheetRing[]): boolean {
  let inside = false;
  for (const ring of rings) {
    let from = ring[ring.length - 1];
    for (const to of ring) {
      if (from !== undefined && from[1] > y !== to[1] > y) {
        const crossX = from[0] + ((y - from[1]) / (to[1] - from[1])) * (to[0] - from[0]);
        if (x < crossX) inside = !inside;
      }
      from = to;
    }
  }
  return inside;
}

/**
 * A free place for a label inside an area, tried from the upper left to the lower right.
 *
 * @param taken boxes that the label must not meet
 * @param covered areas that the label must not lie on, such as what stands higher
 * @returns null where there is none
 */
export function placeInside(
  rings: readonly SheetRing[],
  size: { width: number; height: number },
  taken: readonly LabelBox[],
  covered: readonly (readonly SheetRing[])[] = [],
): LabelBox | null {
  const around = boxAround(rings);
  const steps = 16;
  for (let row = 0; row <= steps; row += 1) {
    for (let column = 0; column <= steps; column += 1) {
      const box = {
        x: around.x + ((around.width - size.width) * column) / steps,
        y: around.y + ((around.height - size.height) * row) / steps,
        ...size,
      };
      if (taken.some((other) => boxesMeet(box, other))) continue;
      const isFree = pointsOf(box).every(
        (point) => isInside(point, rings) && !covered.some((other) => isInside(point, other)),
      );
      if (isFree) return box;
    }
  }
  return null;
}

/** A free place beside an area, inside the frame: right, left, below or above it. */
export function placeBeside(
  rings: readonly SheetRing[],
  size: { width: number; height: number },
  taken: readonly LabelBox[],
  frame: { width: number; height: number },
): LabelBox {
  const around = boxAround(rings);
  const middleY = around.y + around.height / 2 - size.height / 2;
  const middleX = around.x + around.width / 2 - size.width / 2;
  const gap = 10;
  const right = { x: around.x + around.width + gap, y: middleY, ...size };
  const candidates: LabelBox[] = [
    right,
    { x: around.x - gap - size.width, y: middleY, ...size },
    { x: middleX, y: around.y + around.height + gap, ...size },
    { x: middleX, y: around.y - gap - size.height, ...size },
  ];
  const fits = (box: LabelBox) =>
    box.x >= 0 &&
    box.y >= 0 &&
    box.x + box.width <= frame.width &&
    box.y + box.height <= frame.height &&
    !taken.some((other) => boxesMeet(box, other));
  return candidates.find(fits) ?? right;
}

/** Points on a box's border and in its middle, close enough together for labels. */
function pointsOf(box: LabelBox): SheetPoint[] {
  const shares = [0, 0.25, 0.5, 0.75, 1];
  return shares.flatMap((across) =>
    [0, 0.5, 1].map((down): SheetPoint => [box.x + box.width * across, box.y + box.height * down]),
  );
}
