import type { SunDay } from './sun-day.ts';

/** Within which instants the handle of the sun arc moves, and by how much. */
export interface ArcSteps {
  /** The first and the last step with the sun up. */
  firstMs: number;
  lastMs: number;
  /** Where Home and End lead: the judged window's ends, or the day's. */
  homeMs: number;
  endMs: number;
  stepMs: number;
  /** Steps are counted from here. */
  originMs: number;
}

const minuteMs = 60_000;
const hourMs = 60 * minuteMs;

/** The steps of a day, or null where the sun stays down. */
export function listArcSteps(
  day: SunDay,
  window: { fromMs: number; toMs: number } | null,
  stepMs = 300_000,
): ArcSteps | null {
  const [first, last] = [day.curve.at(0), day.curve.at(-1)];
  if (first === undefined || last === undefined) return null;
  const fromStart = (ms: number) => (ms - day.startMs) / stepMs;
  const firstMs = day.startMs + Math.ceil(fromStart(first.atMs)) * stepMs;
  const lastMs = day.startMs + Math.floor(fromStart(last.atMs)) * stepMs;
  if (firstMs > lastMs) return null;
  const clamp = (ms: number) => Math.min(lastMs, Math.max(firstMs, ms));
  return {
    firstMs,
    lastMs,
    // Whole minutes inside the window: a window by the sun has ends to the second, an address has not.
    homeMs: window === null ? firstMs : clamp(Math.ceil(window.fromMs / minuteMs) * minuteMs),
    endMs: window === null ? lastMs : clamp(Math.floor(window.toMs / minuteMs) * minuteMs),
    stepMs,
    originMs: day.startMs,
  };
}

/** The nearest step to an instant, with the sun up. */
export function snapToStep(steps: ArcSteps, atMs: number): number {
  const count = Math.round((atMs - steps.originMs) / steps.stepMs);
  const snappedMs = steps.originMs + count * steps.stepMs;
  return Math.min(steps.lastMs, Math.max(steps.firstMs, snappedMs));
}

/** Where a key of a slider leads from an instant; null for a key that is not the slider's. */
export function moveByKey(steps: ArcSteps, atMs: number, key: string): number | null {
  const { originMs, stepMs, firstMs, lastMs } = steps;
  const clamp = (ms: number) => Math.min(lastMs, Math.max(firstMs, ms));
  const count = (atMs - originMs) / stepMs;
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return clamp(originMs + (Math.floor(count) + 1) * stepMs);
    case 'ArrowLeft':
    case 'ArrowDown':
      return clamp(originMs + (Math.ceil(count) - 1) * stepMs);
    case 'PageUp':
      return clamp(atMs + hourMs);
    case 'PageDown':
      return clamp(atMs - hourMs);
    case 'Home':
      return steps.homeMs;
    case 'End':
      return steps.endMs;
    default:
      return null;
  }
}
