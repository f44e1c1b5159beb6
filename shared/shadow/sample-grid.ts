import { boxOfRings, type PlanePoint, type Ring } from '../geometry/ring.ts';
import {
  addEdgeToRuns,
  packRuns,
  sumAlongRuns,
  type PlacedRun,
  type SamplePoints,
} from './sample-points.ts';

/** What lies in `rings` and in none of `outside` is sampled, and how finely. */
export interface SampledArea {
  rings: readonly Ring[];
  outside: readonly Ring[];
  areaM2: number;
  /** Metres: a wider grid is not used unless the area needs more than `mostPoints`. */
  gridM: number;
  mostPoints: number;
  /** Also points just inside the border, where the most shaded point of an area mostly lies. */
  withBorder: boolean;
}

/** So few points or more, so that a small receptor has a finer grid. */
const leastPoints = 400;
/** A sliver that falls between the rows of its grid gets finer ones, until some points lie in it. */
const leastHits = 16;
const mostHalvings = 6;
/** How far inside the border its points lie, metres. */
const insetM = 0.01;

/**
 * A square grid of points in an area: `gridM` is halved once, narrower where the area is small,
 * wider where it is large. Every second point along x and y is a grid of twice the spacing, so that
 * the points hold four of those, by which a finding can be tried.
 */
export function sampleArea(area: SampledArea): SamplePoints {
  const { areaM2, gridM, mostPoints } = area;
  let spacingM = Math.max(
    Math.min(gridM / 2, Math.sqrt(areaM2 / leastPoints)),
    Math.sqrt(areaM2 / mostPoints),
  );
  let lattice = sampleLattice(area, spacingM);
  for (let halving = 0; halving < mostHalvings && lattice.count < leastHits; halving += 1) {
    spacingM /= 2;
    lattice = sampleLattice(area, spacingM);
  }
  return area.withBorder ? addBorder(area, lattice, spacingM) : lattice;
}

function sampleLattice(area: SampledArea, spacingM: number): SamplePoints {
  const box = boxOfRings(area.rings);
  const columns = Math.max(1, Math.round((box.maxX - box.minX) / spacingM));
  const rows = Math.max(1, Math.round((box.maxY - box.minY) / spacingM));
  // Centred, so that both sides of a box have the same margin.
  const startX = (box.minX + box.maxX - (columns - 1) * spacingM) / 2;
  const startY = (box.minY + box.maxY - (rows - 1) * spacingM) / 2;
  const whole: PlacedRun[] = Array.from({ length: rows }, (_, row) => ({
    y: startY + row * spacingM,
    startX,
    stepX: spacingM,
    first: row * columns,
    length: columns,
  }));
  const isInside = insideTest(whole, rows * columns, area);
  const numbers = new Int32Array(rows * columns).fill(-1);
  const runs: PlacedRun[] = [];
  let count = 0;
  for (const { y, first } of whole) {
    let open: PlacedRun | null = null;
    for (let column = 0; column < columns; column += 1) {
      if (!isInside(first + column)) {
        open = null;
        continue;
      }
      if (open === null) {
        open = { y, startX: startX + column * spacingM, stepX: spacingM, first: count, length: 0 };
        runs.push(open);
      }
      numbers[first + column] = count;
      open.length += 1;
      count += 1;
    }
  }
  const right = new Int32Array(count).fill(-1);
  const up = new Int32Array(count).fill(-1);
  const grid = new Uint8Array(count);
  numbers.forEach((number, cell) => {
    if (number < 0) return;
    const column = cell % columns;
    const row = (cell - column) / columns;
    if (column + 1 < columns) right[number] = numbers[cell + 1] ?? -1;
    if (row + 1 < rows) up[number] = numbers[cell + columns] ?? -1;
    grid[number] = (column & 1) | ((row & 1) << 1);
  });
  return {
    count,
    partCount: count,
    spacingM,
    grid,
    gridCount: 4,
    right,
    up,
    box,
    runs: packRuns(runs),
  };
}

/** Adds points along the border of the area, and of what is cut out of it, one spacing apart. */
function addBorder(area: SampledArea, lattice: SamplePoints, spacingM: number): SamplePoints {
  const places = [
    ...area.rings.flatMap((ring) => pointsBeside(ring, spacingM, insetM)),
    ...area.outside.flatMap((ring) => pointsBeside(ring, spacingM, -insetM)),
  ];
  const single = places.map(([x, y], index): PlacedRun => ({
    y,
    startX: x,
    stepX: 1,
    first: index,
    length: 1,
  }));
  const isInside = insideTest(single, single.length, area);
  const border = single.filter(({ first }) => isInside(first));
  const { y, startX, stepX, first, length } = lattice.runs;
  const count = lattice.count + border.length;
  const extended = (values: Int32Array) => {
    const longer = new Int32Array(count).fill(-1);
    longer.set(values);
    return longer;
  };
  const grid = new Uint8Array(count);
  grid.set(lattice.grid);
  border.forEach((_, index) => {
    grid[lattice.count + index] = index & 1;
  });
  return {
    ...lattice,
    count,
    grid,
    right: extended(lattice.right),
    up: extended(lattice.up),
    runs: packRuns([
      ...Array.from(y, (runY, run) => ({
        y: runY,
        startX: startX[run] ?? NaN,
        stepX: stepX[run] ?? NaN,
        first: first[run] ?? 0,
        length: length[run] ?? 0,
      })),
      ...border.map((run, index) => ({ ...run, first: lattice.count + index })),
    ]),
  };
}

/** Points along a ring, moved to its left. */
function pointsBeside(ring: Ring, spacingM: number, leftM: number): PlanePoint[] {
  return ring.flatMap((from, index) => {
    const to = ring[(index + 1) % ring.length] ?? from;
    const lengthM = Math.hypot(to[0] - from[0], to[1] - from[1]);
    if (lengthM === 0) return [];
    const alongX = (to[0] - from[0]) / lengthM;
    const alongY = (to[1] - from[1]) / lengthM;
    const count = Math.max(1, Math.round(lengthM / spacingM));
    return Array.from({ length: count }, (_, place): PlanePoint => {
      const atM = ((place + 0.5) / count) * lengthM;
      return [from[0] + alongX * atM - alongY * leftM, from[1] + alongY * atM + alongX * leftM];
    });
  });
}

/** Whether a numbered point of some runs lies in the rings and in none of those outside. */
function insideTest(
  placed: readonly PlacedRun[],
  count: number,
  { rings, outside }: Pick<SampledArea, 'rings' | 'outside'>,
): (point: number) => boolean {
  const runs = packRuns(placed);
  const windingsUnder = (some: readonly Ring[]) => {
    const windings = new Int32Array(count);
    for (const ring of some) {
      ring.forEach(([x, y], index) => {
        const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y];
        addEdgeToRuns(runs, windings, x, y, nextX, nextY);
      });
    }
    sumAlongRuns(runs, windings);
    return windings;
  };
  const inside = windingsUnder(rings);
  const cutAway = windingsUnder(outside);
  return (point) => inside[point] !== 0 && cutAway[point] === 0;
}
