import type { Box } from '../geometry/ring.ts';
import type { SweepEdges } from './sweep-edges.ts';

/** Ciura, M. (2001), "Best increments for the average case of Shellsort", FCT 2001, 106–117. */
const shellGaps = [701, 301, 132, 57, 23, 10, 4, 1];

/**
 * The heights at which edges begin or end, and the box's own two: rising, each once.
 *
 * @param into takes them; two for each edge and two more
 * @returns how many there are
 */
export function listHeights(edges: SweepEdges, box: Box, into: Float64Array): number {
  let count = 0;
  for (let edge = 0; edge < edges.count; edge += 1) {
    into[count] = edges.lowY[edge] ?? NaN;
    into[count + 1] = edges.highY[edge] ?? NaN;
    count += 2;
  }
  into[count] = box.minY;
  into[count + 1] = box.maxY;
  count += 2;
  // The library's sort of a typed array costs more than all of this where there are so few.
  for (const gap of shellGaps) {
    for (let index = gap; index < count; index += 1) {
      const moved = into[index] ?? NaN;
      let place = index;
      while (place >= gap && (into[place - gap] ?? NaN) > moved) {
        into[place] = into[place - gap] ?? NaN;
        place -= gap;
      }
      into[place] = moved;
    }
  }
  let kept = 1;
  for (let index = 1; index < count; index += 1) {
    const height = into[index] ?? NaN;
    if (height > (into[kept - 1] ?? NaN)) {
      into[kept] = height;
      kept += 1;
    }
  }
  return kept;
}

/** All edges by their lower ends. @param into takes their indices */
export function sortByLowEnd({ lowY, count }: SweepEdges, into: Int32Array): void {
  for (let index = 0; index < count; index += 1) into[index] = index;
  for (const gap of shellGaps) {
    for (let index = gap; index < count; index += 1) {
      const moved = into[index] ?? 0;
      const movedY = lowY[moved] ?? NaN;
      let place = index;
      while (place >= gap && (lowY[into[place - gap] ?? 0] ?? NaN) > movedY) {
        into[place] = into[place - gap] ?? 0;
        place -= gap;
      }
      into[place] = moved;
    }
  }
}
