import { sampleHours, type DayLight, type DaySamples, type LightState } from './day-light.ts';
import type { RuleMeasure } from './rule-schema.ts';

/** The measures that are taken point by point. */
export type SampleMeasure = Extract<
  RuleMeasure,
  { kind: 'sun-share' | 'sun-area' | 'worst-shade-hours' }
>;

/** What adding up steps may do to a point that has exactly the hours asked for. */
const rounding = 1e-9;

/**
 * A measure of sample points on one day.
 *
 * @param grid one of the grids of twice the spacing, in place of all points
 */
export function measureSamples(
  measure: SampleMeasure,
  { areaM2, samples }: DayLight,
  state: LightState,
  grid?: number,
): number {
  if (samples === null) return 0;
  switch (measure.kind) {
    case 'sun-share':
      return shareWithHours(samples, state, measure.hours, grid);
    case 'sun-area':
      return areaM2 * shareWithHours(samples, state, measure.hours, grid);
    case 'worst-shade-hours':
      return samples.judgedHours - fewestHours(samples, state, grid).hours;
  }
}

/**
 * How much the value can change when every point's sun is longer or shorter by one step, or when the
 * border between its two kinds of points moves by one spacing, whichever is more.
 */
export function samplesTolerance(
  measure: SampleMeasure,
  { areaM2, samples }: DayLight,
  stepHours: number,
): number {
  if (samples === null) return 0;
  const states = ['before', 'after'] as const;
  switch (measure.kind) {
    case 'sun-share':
      return Math.max(...states.map((state) => shareTolerance(samples, state, measure, stepHours)));
    case 'sun-area':
      return (
        areaM2 *
        Math.max(...states.map((state) => shareTolerance(samples, state, measure, stepHours)))
      );
    case 'worst-shade-hours':
      return Math.max(stepHours, ...states.map((state) => largestStepAside(samples, state)));
  }
}

/** How much more than none, or not less than so many hours. */
function hasHours(hours: number, asked: number): boolean {
  return asked === 0 ? hours > rounding : hours >= asked - rounding;
}

function shareWithHours(
  samples: DaySamples,
  state: LightState,
  asked: number,
  grid?: number,
): number {
  const hoursAt = sampleHours(samples, state);
  const { points } = samples;
  let counted = 0;
  let sunny = 0;
  for (let point = 0; point < points.partCount; point += 1) {
    if (grid !== undefined && points.grid[point] !== grid) continue;
    counted += 1;
    if (hasHours(hoursAt(point), asked)) sunny += 1;
  }
  return counted === 0 ? 0 : sunny / counted;
}

function shareTolerance(
  samples: DaySamples,
  state: LightState,
  { hours }: { hours: number },
  stepHours: number,
): number {
  const share = shareWithHours(samples, state, hours);
  const byStep = [hours - stepHours, hours + stepHours]
    .filter((asked) => asked > 0)
    .map((asked) => Math.abs(shareWithHours(samples, state, asked) - share));
  const hoursAt = sampleHours(samples, state);
  const { right, up, partCount } = samples.points;
  // A border of length L crosses L/spacing pairs of neighbours, whichever way it runs.
  const crossings = (neighbours: Int32Array) => {
    let crossed = 0;
    for (let point = 0; point < partCount; point += 1) {
      const other = neighbours[point] ?? -1;
      if (other < 0) continue;
      if (hasHours(hoursAt(point), hours) !== hasHours(hoursAt(other), hours)) crossed += 1;
    }
    return crossed;
  };
  return Math.max(Math.hypot(crossings(right), crossings(up)) / partCount, ...byStep);
}

/** The point with the fewest hours of sun. */
function fewestHours(
  samples: DaySamples,
  state: LightState,
  grid?: number,
): { point: number; hours: number } {
  const hoursAt = sampleHours(samples, state);
  const { count, partCount, grid: grids } = samples.points;
  let fewest = { point: -1, hours: samples.judgedHours };
  for (let point = 0; point < count; point += 1) {
    // Points along the border belong to two grids of twice the spacing, not to four.
    const ofGrid = point < partCount ? grid : grid === undefined ? undefined : grid & 1;
    if (ofGrid !== undefined && grids[point] !== ofGrid) continue;
    const hours = hoursAt(point);
    if (hours < fewest.hours) fewest = { point, hours };
  }
  return fewest;
}

/** How much the most shaded point differs from its neighbours in the grid. */
function largestStepAside(samples: DaySamples, state: LightState): number {
  const hoursAt = sampleHours(samples, state);
  const worst = fewestHours(samples, state);
  const { right, up, partCount } = samples.points;
  let largest = 0;
  for (const neighbours of [right, up]) {
    for (let point = 0; point < partCount; point += 1) {
      const other = neighbours[point] ?? -1;
      if (other < 0 || (point !== worst.point && other !== worst.point)) continue;
      largest = Math.max(largest, Math.abs(hoursAt(point) - hoursAt(other)));
    }
  }
  return largest;
}
