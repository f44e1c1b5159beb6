import type { AreaLight } from '../shadow/receptor-light.ts';
import type { SamplePoints } from '../shadow/sample-points.ts';

/** The light on one receptor through one judged stretch of a day, instant by instant. */
export interface SpanLight {
  atMs: readonly number[];
  /** In m²; for a window in shares of it, 0 to 1. */
  lights: readonly AreaLight[];
  /** The share that would be in sun with no building at all: 0 where the sun stands behind a window's wall, else 1. */
  openShares: readonly number[];
  /** Direct clear-sky irradiance on the receptor's plane where it is in sun, W/m². */
  beamWm2: readonly number[];
}

/** A day's sun on a receptor's sample points, summed over the judged time. */
export interface DaySamples {
  points: SamplePoints;
  /** Hours of sun at each point. */
  hoursBefore: Float64Array;
  hoursAfter: Float64Array;
  /** Hours of sun that every point would have with no building at all. */
  openHours: number;
  /** The length of the judged time. */
  judgedHours: number;
}

/** The light on one receptor on one judged day. */
export interface DayLight {
  date: string;
  /** The area that is judged, open or whole, in m²; 1 for a window, whose light is in shares. */
  areaM2: number;
  isWindow: boolean;
  /** The share that one point of a window's row stands for; 0 where the light is exact. */
  pointShare: number;
  spans: readonly SpanLight[];
  /** Null where no measure is taken point by point, or the day has no judged time. */
  samples: DaySamples | null;
}

/** Before, after, or as if nothing were built at all. */
export type LightState = 'before' | 'after' | 'theoretical';

/** The sunlit part of the judged area at an instant of a span, m². */
export function sunlitAreaM2(
  { lights, openShares }: SpanLight,
  index: number,
  state: LightState,
  areaM2: number,
): number {
  switch (state) {
    case 'before':
      return lights[index]?.sunBeforeM2 ?? 0;
    case 'after':
      return lights[index]?.sunAfterM2 ?? 0;
    case 'theoretical':
      return (openShares[index] ?? 0) * areaM2;
  }
}

/** Hours of sun at each sample point; with no building every point has the same. */
export function sampleHours(samples: DaySamples, state: LightState): (point: number) => number {
  switch (state) {
    case 'before':
      return (point) => samples.hoursBefore[point] ?? 0;
    case 'after':
      return (point) => samples.hoursAfter[point] ?? 0;
    case 'theoretical':
      return () => samples.openHours;
  }
}

/** The time in hours that an instant of a stretch stands for: half a step on each side. */
export function hoursAround(atMs: readonly number[], index: number): number {
  const here = atMs[index] ?? 0;
  const before = atMs[index - 1] ?? here;
  const after = atMs[index + 1] ?? here;
  return (after - before) / 2 / 3_600_000;
}

/** The integral over a stretch of a quantity known at its instants and running straight between them, × hours. */
export function integrateHours(
  span: Pick<SpanLight, 'atMs'>,
  valueAt: (index: number) => number,
): number {
  let total = 0;
  for (let index = 1; index < span.atMs.length; index += 1) {
    const hours = ((span.atMs[index] ?? 0) - (span.atMs[index - 1] ?? 0)) / 3_600_000;
    total += ((valueAt(index - 1) + valueAt(index)) / 2) * hours;
  }
  return total;
}

/** A stretch of a span in which a quantity is at or above a threshold, crossings by straight lines. */
export interface Run {
  startMs: number;
  endMs: number;
}

/** The unbroken stretches in which a quantity is at or above (`strictly`: above) a threshold. */
export function runsAbove(
  span: Pick<SpanLight, 'atMs'>,
  threshold: number,
  valueAt: (index: number) => number,
  strictly = false,
): Run[] {
  const isAbove = (value: number) => (strictly ? value > threshold : value >= threshold);
  const runs: Run[] = [];
  let startMs: number | null = null;
  for (let index = 0; index < span.atMs.length; index += 1) {
    const atMs = span.atMs[index] ?? 0;
    const value = valueAt(index);
    const previous = index > 0 ? valueAt(index - 1) : value;
    const crossing = () => {
      const fromMs = span.atMs[index - 1] ?? atMs;
      return fromMs + ((threshold - previous) / (value - previous)) * (atMs - fromMs);
    };
    if (isAbove(value) && startMs === null) startMs = index === 0 ? atMs : crossing();
    if (!isAbove(value) && startMs !== null) {
      runs.push({ startMs, endMs: crossing() });
      startMs = null;
    }
  }
  if (startMs !== null) runs.push({ startMs, endMs: span.atMs.at(-1) ?? startMs });
  return runs;
}
