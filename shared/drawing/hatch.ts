import type { SheetPoint, SheetRing } from './frame.ts';

/**
 * The lines of a hatch, cut to the inside of rings (even-odd rule), so that a drawing needs neither
 * patterns nor clip paths: it looks the same on screen, in print and in a PDF, and needs no ids.
 * The lines lie on one grid through the sheet's origin: neighbouring areas are hatched alike.
 *
 * @param spacing distance between lines
 * @param angleDeg direction of the lines, counter-clockwise from the right: 45 rises to the right
 */
export function hatchLines(
  rings: readonly SheetRing[],
  spacing: number,
  angleDeg: number,
): [SheetPoint, SheetPoint][] {
  const angle = (angleDeg * Math.PI) / 180;
  const along: SheetPoint = [Math.cos(angle), -Math.sin(angle)];
  const across: SheetPoint = [Math.sin(angle), Math.cos(angle)];
  /** By the line's number on the grid: where along it the rings are crossed. */
  const crossings = new Map<number, number[]>();
  for (const ring of rings) {
    let from = ring[ring.length - 1];
    for (const to of ring) {
      if (from !== undefined) addCrossings(crossings, turn(from), turn(to), spacing);
      from = to;
    }
  }
  return [...crossings.entries()]
    .sort(([a], [b]) => a - b)
    .flatMap(([number, places]) => {
      places.sort((a, b) => a - b);
      const lines: [SheetPoint, SheetPoint][] = [];
      for (let index = 0; index + 1 < places.length; index += 2) {
        const start = places[index];
        const end = places[index + 1];
        if (start === undefined || end === undefined || end - start < 0.05) continue;
        lines.push([turnBack(start, number * spacing), turnBack(end, number * spacing)]);
      }
      return lines;
    });

  function turn([x, y]: SheetPoint): SheetPoint {
    return [x * along[0] + y * along[1], x * across[0] + y * across[1]];
  }
  function turnBack(u: number, v: number): SheetPoint {
    return [u * along[0] + v * across[0], u * along[1] + v * across[1]];
  }
}

/** Where the edge from a to b crosses the grid's lines v = number · spacing; its lower end counts, its upper doesn't. */
function addCrossings(
  crossings: Map<number, number[]>,
  a: SheetPoint,
  b: SheetPoint,
  spacing: number,
): void {
  const [low, high] = a[1] < b[1] ? [a, b] : [b, a];
  for (let number = Math.ceil(low[1] / spacing); number * spacing < high[1]; number += 1) {
    const share = (number * spacing - low[1]) / (high[1] - low[1]);
    const places = crossings.get(number) ?? [];
    places.push(low[0] + share * (high[0] - low[0]));
    crossings.set(number, places);
  }
}
