import {
  integrateHours,
  runsAbove,
  sunlitAreaM2,
  type DayLight,
  type LightState,
  type SpanLight,
} from './day-light.ts';
import type { RuleMeasure } from './rule-schema.ts';
import { measureSamples, samplesTolerance } from './sample-measures.ts';

const hourMs = 3_600_000;

/**
 * A measure's value on one receptor on one day, in the unit of `measureUnits`. Between two judged
 * instants the sunlit area runs along a straight line; a sample point counts half a step on each
 * side of an instant. A day without judged time has no sun and no shade.
 *
 * @param grid for measures of sample points: one of the grids of twice the spacing, in place of all points
 */
export function measureDay(
  measure: RuleMeasure,
  day: DayLight,
  state: LightState,
  grid?: number,
): number {
  const { areaM2, spans } = day;
  const total = (spanValue: (span: SpanLight) => number) =>
    spans.reduce((sum, span) => sum + spanValue(span), 0);
  const areaAt = (span: SpanLight) => (index: number) => sunlitAreaM2(span, index, state, areaM2);
  switch (measure.kind) {
    case 'sun-hours':
      return total((span) => integrateHours(span, areaAt(span))) / areaM2;
    case 'sun-area-hours':
      return total((span) => integrateHours(span, areaAt(span)));
    case 'beam-energy':
      return (
        total((span) =>
          integrateHours(span, (index) => areaAt(span)(index) * (span.beamWm2[index] ?? 0)),
        ) /
        areaM2 /
        1000
      );
    case 'best-run': {
      const lengths = spans.flatMap((span) =>
        runsAbove(span, measure.share * areaM2 - 1e-9, areaAt(span)).map(
          (run) => (run.endMs - run.startMs) / hourMs,
        ),
      );
      return Math.max(0, ...lengths);
    }
    case 'shade-share': {
      const shades = spans.flatMap((span) =>
        span.lights.map((_, index) => 1 - areaAt(span)(index) / areaM2),
      );
      return Math.max(0, ...shades);
    }
    case 'sun-share':
    case 'sun-area':
    case 'worst-shade-hours':
      return measureSamples(measure, day, state, grid);
  }
}

/**
 * How much a measure's value can change within one step of the clause, or within one grid spacing
 * if that is more: what `close` is about. A single judged instant has no step.
 */
export function measureTolerance(measure: RuleMeasure, day: DayLight, stepMin: number): number {
  const isInstant = day.spans.every((span) => span.atMs.length < 2);
  const stepHours = isInstant ? 0 : stepMin / 60;
  // The border of a shadow may lie a point further along a window's row, all the time.
  const judgedHours = day.spans.reduce((sum, span) => sum + integrateHours(span, () => 1), 0);
  const hours = Math.max(stepHours, day.pointShare * judgedHours);
  switch (measure.kind) {
    case 'sun-hours':
    case 'best-run':
      return hours;
    case 'sun-area-hours':
      return hours * day.areaM2;
    case 'beam-energy':
      return (hours * Math.max(0, ...day.spans.flatMap((span) => span.beamWm2))) / 1000;
    case 'shade-share': {
      const changes = day.spans.flatMap((span) =>
        span.lights
          .slice(1)
          .map((light, index) =>
            Math.abs(light.sunAfterM2 - (span.lights[index]?.sunAfterM2 ?? 0)),
          ),
      );
      return Math.max(day.pointShare, ...changes.map((changeM2) => changeM2 / day.areaM2));
    }
    case 'sun-share':
    case 'sun-area':
    case 'worst-shade-hours':
      return isInstant ? 0 : samplesTolerance(measure, day, stepHours);
  }
}

/** What a measure of shade is the rest of: the whole area, or the whole judged time. */
export function wholeOf(measure: RuleMeasure, day: DayLight): number {
  return measure.kind === 'worst-shade-hours' ? (day.samples?.judgedHours ?? 0) : 1;
}
