import type { SunLedger } from '../receptors/sun-ledger-schema.ts';
import { integrateHours, runsAbove, type Run, type SpanLight } from '../rules/day-light.ts';
import { instantsOfSpan } from '../rules/rule-window.ts';
import { createInstantFormat, wholeClockHours } from '../solar/civil-time.ts';
import { keyDatesOfYear } from '../solar/key-dates.ts';
import { sunAboveSpans } from '../solar/sun-above.ts';
import type { SunPosition } from '../solar/sun-position.ts';
import { beamOnReceptorWm2, skyOf } from './clear-sky.ts';
import type { StudyInput } from './evidence-schema.ts';
import { lightAtInstant } from './instant-light.ts';
import { roundArea, roundEnergy, roundMeasure } from './rounding.ts';
import { buildScene, type Scene, type SceneReceptor } from './scene.ts';

interface LedgerSpan extends Pick<SpanLight, 'atMs' | 'lights' | 'beamWm2'> {
  suns: readonly SunPosition[];
}

/** The share of a receptor's open area whose loss counts as losing the sun there. */
const noticedShare = 0.05;

/**
 * The sun ledger of one receptor on the four key dates: what it has before, after, and loses, hour
 * by hour, in hours, square metres × hours and direct clear-sky energy. Quantities run straight
 * between steps.
 *
 * @param stepMin minutes between samples
 * @throws when the study has no receptor of that id, or it has no open area
 */
export function computeReceptorLedger(
  input: StudyInput,
  receptorId: string,
  stepMin = 5,
): SunLedger {
  const feature = input.receptors.features.find(({ properties }) => properties.id === receptorId);
  if (feature === undefined) throw new Error(`The study has no receptor ${receptorId}.`);
  const scene = buildScene({ ...input, receptors: { ...input.receptors, features: [feature] } });
  const receptor = scene.receptors[0];
  if (receptor === undefined) throw new Error(`The study has no receptor ${receptorId}.`);
  return {
    receptor: receptor.id,
    class: receptor.class,
    label: receptor.label,
    planeM: receptor.planeM,
    openAreaM2: receptor.front === null ? roundArea(receptor.openAreaM2) : null,
    stepMin,
    days: keyDatesOfYear(input.year, input.place.timezone).map(({ event, date }) => ({
      event,
      ...computeLedgerDay(input, scene, receptor, date, stepMin),
    })),
  };
}

/**
 * The account of one receptor of a scene on one civil date; see `computeReceptorLedger`.
 *
 * @param date `YYYY-MM-DD` on the clock of the place
 * @param stepMin minutes between samples
 */
export function computeLedgerDay(
  input: StudyInput,
  scene: Scene,
  receptor: SceneReceptor,
  date: string,
  stepMin: number,
): Omit<SunLedger['days'][number], 'event'> {
  const { timezone, longitude, latitude } = input.place;
  const spans = sunAboveSpans(date, timezone, longitude, latitude, 0);
  const hours = wholeClockHours(date, timezone);
  const lit = spans.flatMap((span) => {
    // Cut at the clock hours, so that each hour's account is a sum of whole steps.
    const cuts = [
      span.startMs,
      ...hours.filter((at) => at > span.startMs && at < span.endMs),
      span.endMs,
    ];
    return cuts.slice(1).map((endMs, index) =>
      lightThrough(input, scene, receptor, date, {
        startMs: cuts[index] ?? endMs,
        endMs,
        stepMin,
      }),
    );
  });
  const instant = createInstantFormat(timezone);
  const first = spans[0];
  const last = spans.at(-1);
  return {
    date,
    sunriseAt: first === undefined ? null : instant(first.startMs),
    sunsetAt: last === undefined ? null : instant(last.endMs),
    ...account(lit, receptor.openAreaM2),
    lostSpans: joinRuns(
      lit.flatMap((span) =>
        runsAbove(
          span,
          noticedShare * receptor.openAreaM2,
          (index) => span.lights[index]?.netNewM2 ?? 0,
        ),
      ),
    ).map((run) => ({ fromAt: instant(run.startMs), toAt: instant(run.endMs) })),
    hours: lit.map((span) => ({
      fromAt: instant(span.atMs[0] ?? 0),
      toAt: instant(span.atMs.at(-1) ?? 0),
      ...account([span], receptor.openAreaM2),
    })),
    samples: lit.flatMap((span, spanIndex) => {
      // The first instant of a span is the last of the one before.
      const skipped = spanIndex === 0 ? 0 : 1;
      return span.atMs.slice(skipped).map((atMs, index) => {
        const light = span.lights[skipped + index];
        const share = (areaM2: number) =>
          receptor.openAreaM2 > 0 ? roundMeasure(areaM2 / receptor.openAreaM2) : 0;
        return {
          at: instant(atMs),
          altitudeDeg: roundMeasure(span.suns[skipped + index]?.altitudeDeg ?? NaN),
          shareBefore: share(light?.sunBeforeM2 ?? 0),
          shareAfter: share(light?.sunAfterM2 ?? 0),
        };
      });
    }),
  };
}

function lightThrough(
  input: StudyInput,
  scene: Scene,
  receptor: SceneReceptor,
  date: string,
  { startMs, endMs, stepMin }: { startMs: number; endMs: number; stepMin: number },
): LedgerSpan {
  const atMs = instantsOfSpan({ startMs, endMs }, stepMin);
  const sky = skyOf(date, input);
  const { area, planeM } = receptor;
  const within = { box: area.box, lowestPlaneM: planeM };
  const instants = atMs.map((at) => lightAtInstant(scene, scene.blocks, input, at, within));
  return {
    atMs,
    suns: instants.map(({ sun }) => sun),
    lights: instants.map(({ lightOn }) => lightOn(receptor, planeM)),
    beamWm2: instants.map(({ sun }) => beamOnReceptorWm2(sun, receptor, sky)),
  };
}

/** Before, after and lost over some spans: mean hours, m² × hours and kWh/m². */
function account(spans: readonly LedgerSpan[], openAreaM2: number) {
  const balance = (
    valueAt: (span: LedgerSpan, index: number, areaM2: number) => number,
    round: (value: number) => number,
  ) => {
    const total = (state: 'sunBeforeM2' | 'sunAfterM2') =>
      spans.reduce(
        (sum, span) =>
          sum +
          integrateHours(span, (index) => valueAt(span, index, span.lights[index]?.[state] ?? 0)),
        0,
      );
    const before = total('sunBeforeM2');
    const after = total('sunAfterM2');
    return { before: round(before), after: round(after), lost: round(before - after) };
  };
  const share = (areaM2: number) => (openAreaM2 > 0 ? areaM2 / openAreaM2 : 0);
  return {
    sunHours: balance((_span, _index, areaM2) => share(areaM2), roundMeasure),
    areaHoursM2h: balance((_span, _index, areaM2) => areaM2, roundArea),
    beamEnergyKwhM2: balance(
      (span, index, areaM2) => (share(areaM2) * (span.beamWm2[index] ?? 0)) / 1000,
      roundEnergy,
    ),
  };
}

/** Runs that meet at the end of one span and the start of the next are one. */
function joinRuns(runs: readonly Run[]): Run[] {
  return runs.reduce<Run[]>((joined, run) => {
    const last = joined.at(-1);
    if (last !== undefined && run.startMs - last.endMs < 1000) {
      return [...joined.slice(0, -1), { startMs: last.startMs, endMs: run.endMs }];
    }
    return run.endMs > run.startMs ? [...joined, run] : joined;
  }, []);
}
