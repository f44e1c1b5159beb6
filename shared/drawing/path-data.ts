import type { Frame, SheetPoint, SheetRing } from './frame.ts';

/** Path data of closed rings, to tenths; points that fall on their predecessor are left out. */
export function closedPath(rings: readonly SheetRing[]): string {
  return rings
    .map((ring) => withoutRepeats(ring.map(round)))
    .filter((ring) => ring.length >= 3)
    .map((ring) => `M${ring.map(write).join('L')}Z`)
    .join('');
}

/** Path data of an open line through the points. */
export function linePath(points: readonly SheetPoint[]): string {
  return points.length < 2 ? '' : `M${withoutRepeats(points.map(round)).map(write).join('L')}`;
}

/** Path data of separate straight lines. */
export function segmentsPath(segments: readonly (readonly [SheetPoint, SheetPoint])[]): string {
  return segments.map(([from, to]) => `M${write(round(from))}L${write(round(to))}`).join('');
}

/** Path data of the rings' outlines without the edges that lie on the frame, where the ground was cut off. */
export function outlinePath(rings: readonly SheetRing[], frame: Frame): string {
  const onFrame = ([ax, ay]: SheetPoint, [bx, by]: SheetPoint) =>
    (ax === bx && (ax === 0 || ax === frame.width)) ||
    (ay === by && (ay === 0 || ay === frame.height));
  return rings
    .map((ring) => {
      const cutAt = ring.findIndex((point, index) => {
        const next = ring[(index + 1) % ring.length];
        return next !== undefined && onFrame(point, next);
      });
      if (cutAt === -1) return closedPath([ring]);
      const turned = [...ring.slice(cutAt + 1), ...ring.slice(0, cutAt + 1)];
      const lines: SheetPoint[][] = [];
      let line: SheetPoint[] = [];
      for (const point of turned) {
        const last = line[line.length - 1];
        if (last !== undefined && onFrame(last, point)) {
          lines.push(line);
          line = [];
        }
        line.push(point);
      }
      return [...lines, line].map(linePath).join('');
    })
    .join('');
}

function round([x, y]: SheetPoint): SheetPoint {
  return [Math.round(x * 10) / 10, Math.round(y * 10) / 10];
}

function withoutRepeats(points: readonly SheetPoint[]): SheetPoint[] {
  return points.filter((point, index) => {
    const previous = points[index - 1];
    return previous === undefined || point[0] !== previous[0] || point[1] !== previous[1];
  });
}

function write([x, y]: SheetPoint): string {
  return `${x} ${y}`;
}
