import {
  integrateHours,
  runsAbove,
  sunlitAreaM2,
  type DayLight,
  type LightState,
} from './day-light.ts';
import type { MeasureKind, RuleMeasure } from './rule-schema.ts';

const hourMs = 3_600_000;

/** Whether a measure adds up over a clause's days, so that its limits hold on their sum. */
export function addsUpOverDays(kind: MeasureKind): boolean {
  return kind === 'sun-area-hours' || kind === 'beam-energy';
}

/** Whether more of a measure means less sun. */
export function measuresShade(kind: MeasureKind): boolean {
  return kind === 'shade-share';
}

/**
 * A measure's value on one receptor on one day, in the unit of `measureUnits`. Between two judged
 * instants the sunlit area runs along a straight line.
 */
export function measureDay(measure: RuleMeasure, day: DayLight, state: LightState): number {
  const { areaM2, spans } = day;
  const total = (spanValue: (span: (typeof spans)[number]) => number) =>
    spans.reduce((sum, span) => sum + spanValue(span), 0);
  const areaAt = (span: (typeof spans)[number]) => (index: number) => {
    const light = span.lights[index];
    return light === undefined ? 0 : sunlitAreaM2(light, state, areaM2);
  };
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
  }
}

/**
 * How much a measure's value can change within one step of the clause: what `close` is about. A
 * single judged instant has no step, so the tolerance is 0.
 */
export function stepTolerance(measure: RuleMeasure, day: DayLight, stepMin: number): number {
  const stepHours = stepMin / 60;
  const isInstant = day.spans.every((span) => span.atMs.length < 2);
  if (isInstant) return 0;
  switch (measure.kind) {
    case 'sun-hours':
    case 'best-run':
      return stepHours;
    case 'sun-area-hours':
      return stepHours * day.areaM2;
    case 'beam-energy':
      return (stepHours * Math.max(...day.spans.flatMap((span) => span.beamWm2))) / 1000;
    case 'shade-share': {
      const changes = day.spans.flatMap((span) =>
        span.lights
          .slice(1)
          .map((light, index) =>
            Math.abs(light.sunAfterM2 - (span.lights[index]?.sunAfterM2 ?? 0)),
          ),
      );
      return Math.max(0, ...changes) / day.areaM2;
    }
  }
}
