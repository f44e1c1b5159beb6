import { describeFinding } from '../rules/finding-sentence.ts';
import {
  createReceptorJudge,
  type ClauseJudgement,
  type ReceptorJudge,
} from '../rules/judge-receptor.ts';
import type { RuleClause } from '../rules/rule-schema.ts';
import type { PointSampler } from '../shadow/point-light.ts';
import type { SamplePoints } from '../shadow/sample-points.ts';
import type { IndexedBlocks } from '../shadow/shadow-layer.ts';
import type { ClausePlan, JudgedReceptor } from './clause-plan.ts';
import { createDayGatherer, emptyDayLight, type DayGatherer } from './day-gatherer.ts';
import type { ClauseResult, StudyFindings, StudyInput } from './evidence-schema.ts';
import type { InstantLight } from './instant-light.ts';
import { roundByUnit, roundMeasure } from './rounding.ts';

/** Gathers the light of judged instants as they are computed, and judges when all are there. */
export interface StudyJudge {
  /**
   * Takes what an instant holds for every clause that wants it. A day's light is let go as soon as
   * the day is judged.
   *
   * @param lightOf the light of the instant where these blocks stand
   */
  take: (atMs: number, lightOf: (blocks: IndexedBlocks) => InstantLight) => void;
  judge: () => { results: Map<string, ClauseResult[]>; findings: StudyFindings };
}

/**
 * Makes the judge of a study's clauses.
 *
 * @param blocksOf what stands for a clause: with or without what is approved nearby
 */
export function createStudyJudge(
  plans: readonly ClausePlan[],
  input: StudyInput,
  sampler: PointSampler,
  blocksOf: (plan: ClausePlan) => IndexedBlocks,
): StudyJudge {
  const judges = plans.map((plan) => createClauseJudge(plan, input, sampler));
  return {
    take: (atMs, lightOf) => {
      plans.forEach((plan, index) => {
        judges[index]?.take(atMs, () => lightOf(blocksOf(plan)));
      });
    },
    judge: () => {
      const results = new Map<string, ClauseResult[]>();
      const energies: Energy[] = [];
      const clauses = plans.map((plan, planIndex) => {
        const notMet: string[] = [];
        plan.receptors.forEach((judged, index) => {
          const judge = judges[planIndex]?.receptors[index];
          if (judge === undefined) return;
          const judgements = judge.judge();
          const { id } = judged.receptor;
          if (judgements.some(({ finding }) => finding === 'not-met')) notMet.push(id);
          results.set(id, [
            ...(results.get(id) ?? []),
            ...judgements.map((one) => resultOf(plan.clause, one, judged)),
          ]);
          energies.push({ weight: plan.clause.weight, ...judge.energyKwh() });
        });
        return {
          clause: plan.clause.id,
          finding: findingOfClause(plan, notMet),
          receptorsNotMet: notMet,
        };
      });
      return {
        results,
        findings: {
          met: clauses.every((clause) => clause.receptorsNotMet.length === 0),
          lossIndex: roundMeasure(lossIndex(energies)),
          clauses,
        },
      };
    },
  };
}

interface ClauseJudge {
  receptors: ReceptorJudge[];
  take: (atMs: number, light: () => InstantLight) => void;
}

function createClauseJudge(
  plan: ClausePlan,
  input: StudyInput,
  sampler: PointSampler,
): ClauseJudge {
  const { clause, groups, spansOfDate } = plan;
  const receptors = plan.receptors.map(() => createReceptorJudge(clause, groups, input.rule.bands));
  const datesAt = new Map<number, string[]>();
  for (const [date, spans] of spansOfDate) {
    for (const atMs of new Set(spans.flat())) {
      datesAt.set(atMs, [...(datesAt.get(atMs) ?? []), date]);
    }
    if (spans.length > 0) continue;
    plan.receptors.forEach((judged, index) => {
      receptors[index]?.takeDay(emptyDayLight(date, judged));
    });
  }
  const gatherers = new Map<string, DayGatherer>();
  const gathererOf = (date: string) => {
    const gatherer =
      gatherers.get(date) ??
      createDayGatherer(date, spansOfDate.get(date) ?? [], plan.receptors, input, sampler);
    gatherers.set(date, gatherer);
    return gatherer;
  };
  return {
    receptors,
    take: (atMs, light) => {
      for (const date of datesAt.get(atMs) ?? []) {
        const gatherer = gathererOf(date);
        gatherer.take(light());
        if (!gatherer.isComplete()) continue;
        gatherer.dayLights().forEach((day, index) => receptors[index]?.takeDay(day));
        gatherers.delete(date);
      }
    },
  };
}

/** kWh of clear-sky beam on a receptor. */
interface Energy {
  weight: number;
  before: number;
  after: number;
}

function findingOfClause(plan: ClausePlan, notMet: readonly string[]) {
  if (plan.receptors.length === 0) return 'no-receptor' as const;
  return notMet.length === 0 ? ('met' as const) : ('not-met' as const);
}

/** 0 to 100: weighted energy lost over weighted energy before, of the receptors that lose any. */
function lossIndex(energies: readonly Energy[]): number {
  const losing = energies.filter(({ before, after }) => before - after > 1e-9);
  const sum = (valueOf: (energy: Energy) => number) =>
    losing.reduce((total, energy) => total + energy.weight * valueOf(energy), 0);
  const before = sum((energy) => energy.before);
  return before > 0 ? (100 * sum((energy) => energy.before - energy.after)) / before : 0;
}

function resultOf(
  clause: RuleClause,
  judgement: ClauseJudgement,
  { receptor, samples }: JudgedReceptor,
): ClauseResult {
  const spacingM = spacingOf(receptor.front?.points ?? samples);
  return {
    clause: clause.id,
    day: judgement.day,
    finding: judgement.finding,
    close: judgement.close,
    loss: judgement.loss === null ? null : roundMeasure(judgement.loss),
    band: judgement.band,
    tests: judgement.tests.map((test) => ({
      measure: test.measure,
      unit: test.unit,
      before: roundByUnit(test.before, test.unit),
      after: roundByUnit(test.after, test.unit),
      limit: roundByUnit(test.limit, test.unit),
      margin: roundByUnit(test.margin, test.unit),
      met: test.met,
    })),
    spacingM,
    note: describeFinding(clause, judgement, receptor.class, receptor.label, spacingM),
    ...(judgement.daysNotMet === null ? {} : { daysNotMet: judgement.daysNotMet }),
  };
}

/** The light of a window is always taken at points, that of an area where a measure asks for it. */
function spacingOf(points: SamplePoints | null): number | null {
  return points === null || points.spacingM === null ? null : roundMeasure(points.spacingM);
}
