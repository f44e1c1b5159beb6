import type { DayLight, SpanLight } from '../rules/day-light.ts';
import { expandDays, type DayGroup } from '../rules/rule-days.ts';
import type { RuleClause } from '../rules/rule-schema.ts';
import { instantsOfSpan, windowSpans } from '../rules/rule-window.ts';
import type { AreaLight } from '../shadow/receptor-light.ts';
import { clearSkyBeamWm2, incidenceCosine, type ClearSky } from '../solar/clear-sky-beam.ts';
import { sunPositionAt } from '../solar/sun-position.ts';
import type { StudyInput } from './evidence-schema.ts';
import type { Scene, SceneReceptor } from './scene.ts';

/** A receptor as a clause judges it: on the clause's plane, of its open or whole area. */
export interface JudgedReceptor {
  receptor: SceneReceptor;
  planeM: number;
  areaM2: number;
}

/** What one clause needs: its days, the judged instants of each, and its receptors. */
export interface ClausePlan {
  clause: RuleClause;
  groups: DayGroup[];
  /** For each date, the instants of each stretch of its window. */
  spansOfDate: Map<string, number[][]>;
  receptors: JudgedReceptor[];
}

/** Below this a receptor is built over and has nothing to judge, m². */
const leastAreaM2 = 0.01;

/** Works out what each clause of a rule judges in a scene. */
export function planClauses(input: StudyInput, scene: Scene): ClausePlan[] {
  return input.rule.clauses.map((clause) => {
    const groups = expandDays(clause.days, input.year, input.place);
    const dates = [...new Set(groups.flatMap((group) => group.dates))].sort();
    return {
      clause,
      groups,
      spansOfDate: new Map(
        dates.map((date) => [
          date,
          windowSpans(clause, date, input.place).map((span) => instantsOfSpan(span, clause.step)),
        ]),
      ),
      receptors: scene.receptors.flatMap((receptor) => {
        if (receptor.isOnSite || !clause.receptors.classes.includes(receptor.class)) return [];
        const areaM2 = clause.receptors.of === 'whole' ? receptor.wholeAreaM2 : receptor.openAreaM2;
        if (areaM2 < leastAreaM2) return [];
        return [{ receptor, planeM: clause.receptors.plane ?? receptor.planeM, areaM2 }];
      }),
    };
  });
}

/** Puts the light on a receptor at the judged instants together with the energy that it carries. */
export function makeDayLight(
  date: string,
  judged: JudgedReceptor,
  spans: readonly number[][],
  lightAt: (atMs: number) => AreaLight,
  input: StudyInput,
): DayLight {
  const sky = skyOf(date, input);
  return {
    date,
    areaM2: judged.areaM2,
    spans: spans.map((atMs): SpanLight => ({
      atMs,
      lights: atMs.map(lightAt),
      beamWm2: atMs.map((instant) => beamOnReceptorWm2(instant, judged.receptor, sky, input)),
    })),
  };
}

/** The clear sky of a date: what the beam depends on besides the sun. */
export function skyOf(date: string, input: StudyInput): ClearSky {
  const startOfYear = Date.parse(`${date.slice(0, 4)}-01-01`);
  return {
    dayOfYear: Math.round((Date.parse(date) - startOfYear) / 86_400_000) + 1,
    elevationM: input.place.elevation,
    linkeTurbidity: input.settings.beam.linkeTurbidity,
  };
}

/** Direct clear-sky irradiance on a receptor's own slope, W/m². */
export function beamOnReceptorWm2(
  atMs: number,
  receptor: Pick<SceneReceptor, 'tiltDeg' | 'facingDeg'>,
  sky: ClearSky,
  input: StudyInput,
): number {
  const sun = sunPositionAt(atMs, input.place.longitude, input.place.latitude);
  return (
    clearSkyBeamWm2(sun.altitudeDeg, sky) *
    incidenceCosine(sun, receptor.tiltDeg, receptor.facingDeg)
  );
}
