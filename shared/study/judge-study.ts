import type { DayLight } from '../rules/day-light.ts';
import { describeFinding } from '../rules/finding-sentence.ts';
import { beamEnergyKwh, judgeReceptor, type ClauseJudgement } from '../rules/judge-receptor.ts';
import type { ReceptorClass, RuleClause } from '../rules/rule-schema.ts';
import { makeDayLight, type ClausePlan, type JudgedReceptor } from './clause-plan.ts';
import type { ClauseResult, StudyFindings, StudyInput } from './evidence-schema.ts';
import type { InstantLight } from './instant-light.ts';
import { roundByUnit, roundMeasure } from './rounding.ts';

/** Gathers the light of judged instants as they are computed, and judges when all are there. */
export interface StudyJudge {
  /** Takes what an instant of a judged date holds for every clause that wants it. */
  take: (date: string, instant: InstantLight) => void;
  judge: () => { results: Map<string, ClauseResult[]>; findings: StudyFindings };
}

/**
 * Makes the judge of a study's clauses.
 */
export function createStudyJudge(plans: readonly ClausePlan[], input: StudyInput): StudyJudge {
  // For each clause and receptor, the light by instant.
  const lights = plans.map((plan) =>
    plan.receptors.map(() => new Map<number, ReturnType<InstantLight['lightOn']>>()),
  );
  const wanted = plans.map(
    (plan) =>
      new Map([...plan.spansOfDate].map(([date, spans]) => [date, new Set(spans.flat())] as const)),
  );
  return {
    take: (date, instant) => {
      plans.forEach((plan, planIndex) => {
        if (wanted[planIndex]?.get(date)?.has(instant.atMs) !== true) return;
        plan.receptors.forEach(({ receptor, planeM }, index) => {
          lights[planIndex]?.[index]?.set(instant.atMs, instant.lightOn(receptor, planeM));
        });
      });
    },
    judge: () => {
      const results = new Map<string, ClauseResult[]>();
      const energies: Energy[] = [];
      const clauses = plans.map((plan, planIndex) => {
        const notMet: string[] = [];
        plan.receptors.forEach((judged, index) => {
          const known = lights[planIndex]?.[index];
          const days = daysOf(plan, judged, input, (atMs) => {
            const light = known?.get(atMs);
            if (light === undefined) throw new Error('A judged instant was never computed.');
            return light;
          });
          const judgements = judgeReceptor(
            plan.clause,
            plan.groups,
            input.rule.bands,
            (date) => days.get(date) ?? { date, areaM2: judged.areaM2, spans: [] },
          );
          const { id } = judged.receptor;
          if (judgements.some(({ finding }) => finding === 'not-met')) notMet.push(id);
          results.set(id, [
            ...(results.get(id) ?? []),
            ...judgements.map((one) => resultOf(plan.clause, one, judged.receptor)),
          ]);
          energies.push(energyOf(plan.clause, [...days.values()]));
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

interface Energy {
  weight: number;
  beforeKwh: number;
  afterKwh: number;
}

function daysOf(
  plan: ClausePlan,
  judged: JudgedReceptor,
  input: StudyInput,
  lightAt: (atMs: number) => ReturnType<InstantLight['lightOn']>,
): Map<string, DayLight> {
  return new Map(
    [...plan.spansOfDate].map(([date, spans]) => [
      date,
      makeDayLight(date, judged, spans, lightAt, input),
    ]),
  );
}

function findingOfClause(plan: ClausePlan, notMet: readonly string[]) {
  if (plan.receptors.length === 0) return 'no-receptor' as const;
  return notMet.length === 0 ? ('met' as const) : ('not-met' as const);
}

function energyOf(clause: RuleClause, days: readonly DayLight[]): Energy {
  return {
    weight: clause.weight,
    beforeKwh: beamEnergyKwh(days, 'before'),
    afterKwh: beamEnergyKwh(days, 'after'),
  };
}

/** 0 to 100: weighted energy lost over weighted energy before, of the receptors that lose any. */
function lossIndex(energies: readonly Energy[]): number {
  const losing = energies.filter(({ beforeKwh, afterKwh }) => beforeKwh - afterKwh > 1e-9);
  const sum = (valueOf: (energy: Energy) => number) =>
    losing.reduce((total, energy) => total + energy.weight * valueOf(energy), 0);
  const before = sum(({ beforeKwh }) => beforeKwh);
  return before > 0 ? (100 * sum(({ beforeKwh, afterKwh }) => beforeKwh - afterKwh)) / before : 0;
}

function resultOf(
  clause: RuleClause,
  judgement: ClauseJudgement,
  receptor: { class: ReceptorClass; label: string },
): ClauseResult {
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
    spacingM: null,
    note: describeFinding(clause, judgement, receptor.class, receptor.label),
    ...(judgement.daysNotMet === null ? {} : { daysNotMet: judgement.daysNotMet }),
  };
}
