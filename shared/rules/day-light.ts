import type { AreaLight } from '../shadow/receptor-light.ts';

/** The light on one receptor through one judged stretch of a day, instant by instant. */
export interface SpanLight {
  atMs: readonly number[];
  lights: readonly AreaLight[];
  /** Direct clear-sky irradiance on the receptor's plane where it is in sun, W/m². */
  beamWm2: readonly number[];
}

/** The light on one receptor on one judged day. */
export interface DayLight {
  date: string;
  /** The area that is judged: open, or whole. */
  areaM2: number;
  spans: readonly SpanLight[];
}

/** Before, after, or as if nothing were built at all. */
export type LightState = 'before' | 'after' | 'theoretical';

/** The sunlit part of the judged area at an instant, m². */
export function sunlitAreaM2(light: AreaLight, state: LightState, areaM2: number): number {
  switch (state) {
    case 'before':
      return light.sunBeforeM2;
    case 'after':
      return light.sunAfterM2;
    case 'theoretical':
      return areaM2;
  }
}

/** The integral over a stretch of a quantity known at its instants and running straight between them, × hours. */
export function integrateHours(span: SpanLight, valueAt: (index: number) => number): number {
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
  span: SpanLight,
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
