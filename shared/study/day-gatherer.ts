import { hoursAround, type DayLight, type DaySamples } from '../rules/day-light.ts';
import type { PointSampler } from '../shadow/point-light.ts';
import type { AreaLight } from '../shadow/receptor-light.ts';
import { isInFront } from '../shadow/window-front.ts';
import { clearSkyBeamWm2, incidenceCosine } from '../solar/clear-sky-beam.ts';
import type { SunPosition } from '../solar/sun-position.ts';
import type { JudgedReceptor } from './clause-plan.ts';
import { skyOf } from './clear-sky.ts';
import type { StudyInput } from './evidence-schema.ts';
import type { InstantLight } from './instant-light.ts';
import { openShare } from './measure-light.ts';

/** Gathers the light of one judged date on a clause's receptors, instant by instant. */
export interface DayGatherer {
  /** Takes an instant of the date; each once, in any order. */
  take: (instant: InstantLight) => void;
  isComplete: () => boolean;
  /** The day's light on each receptor, when all instants are taken. */
  dayLights: () => DayLight[];
}

/** An area in sun or in shade all but for rounding need not be looked at point by point, m². */
const roundingM2 = 1e-6;

/** @param spans the judged instants of each stretch of the date */
export function createDayGatherer(
  date: string,
  spans: readonly (readonly number[])[],
  receptors: readonly JudgedReceptor[],
  input: StudyInput,
  sampler: PointSampler,
): DayGatherer {
  const sky = skyOf(date, input);
  const suns = new Map<number, { sun: SunPosition; beamWm2: number }>();
  const lights = receptors.map(() => new Map<number, AreaLight>());
  const samples = receptors.map(({ samples: points }): DaySamples | null =>
    points === null
      ? null
      : {
          points,
          hoursBefore: new Float64Array(points.count),
          hoursAfter: new Float64Array(points.count),
          openHours: 0,
          judgedHours: 0,
        },
  );
  const instantCount = new Set(spans.flat()).size;
  const hoursOf = (atMs: number) =>
    spans.reduce((sum, span) => {
      const index = span.indexOf(atMs);
      return index < 0 ? sum : sum + hoursAround(span, index);
    }, 0);
  return {
    take: (instant) => {
      const { atMs, sun } = instant;
      suns.set(atMs, { sun, beamWm2: clearSkyBeamWm2(sun.altitudeDeg, sky) });
      const hours = hoursOf(atMs);
      receptors.forEach((judged, index) => {
        const light = instant.lightOn(judged.receptor, judged.planeM);
        lights[index]?.set(atMs, light);
        const day = samples[index] ?? null;
        if (day === null) return;
        day.judgedHours += hours;
        day.openHours += hours * openShare(judged.receptor, sun);
        addSampleHours(day, judged, light, instant, hours, sampler);
      });
    },
    isComplete: () => suns.size === instantCount,
    dayLights: () =>
      receptors.map((judged, index) => ({
        date,
        areaM2: judged.areaM2,
        ...kindOf(judged),
        spans: spans.map((atMs) => ({
          atMs,
          lights: atMs.map((at) => taken(lights[index], at)),
          openShares: atMs.map((at) => openShare(judged.receptor, taken(suns, at).sun)),
          beamWm2: atMs.map((at) => {
            const { sun, beamWm2 } = taken(suns, at);
            const { tiltDeg, facingDeg } = judged.receptor;
            return beamWm2 * incidenceCosine(sun, tiltDeg, facingDeg);
          }),
        })),
        samples: samples[index] ?? null,
      })),
  };
}

/** The light on receptors on a date on which the sun does not stand in the window. */
export function emptyDayLight(date: string, judged: JudgedReceptor): DayLight {
  return { date, areaM2: judged.areaM2, ...kindOf(judged), spans: [], samples: null };
}

function kindOf({
  receptor: { front },
}: JudgedReceptor): Pick<DayLight, 'isWindow' | 'pointShare'> {
  if (front === null) return { isWindow: false, pointShare: 0 };
  const { count } = front.points;
  return { isWindow: true, pointShare: count > 1 ? 1 / count : 0 };
}

function taken<Value>(values: ReadonlyMap<number, Value> | undefined, atMs: number): Value {
  const value = values?.get(atMs);
  if (value === undefined) throw new Error('A judged instant was never computed.');
  return value;
}

function addSampleHours(
  { points, hoursBefore, hoursAfter }: DaySamples,
  { receptor, planeM, areaM2 }: JudgedReceptor,
  { sunBeforeM2, sunAfterM2 }: AreaLight,
  instant: InstantLight,
  hours: number,
  sampler: PointSampler,
): void {
  if (receptor.front !== null && !isInFront(receptor.front, instant.sun)) return;
  const layer = instant.layerOn(planeM);
  if (layer === null) return;
  if (sunBeforeM2 < roundingM2 && sunAfterM2 < roundingM2) return;
  const isAllLit = sunBeforeM2 > areaM2 - roundingM2 && sunAfterM2 > areaM2 - roundingM2;
  const light = isAllLit ? null : sampler(points, layer);
  for (let point = 0; point < points.count; point += 1) {
    hoursBefore[point] = (hoursBefore[point] ?? 0) + hours * (light?.before[point] ?? 1);
    hoursAfter[point] = (hoursAfter[point] ?? 0) + hours * (light?.after[point] ?? 1);
  }
}
