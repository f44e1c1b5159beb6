import type { FindingRow } from '../../../shared/contracts/studies.ts';
import type { ClauseResult, EvidenceFile } from '../../../shared/study/evidence-schema.ts';

type ClauseTest = ClauseResult['tests'][number];

/**
 * The findings table of a study: one row for each receptor under each clause, taken from the evidence
 * as it stands. Of a clause with several limits the row shows the one that decides: the first that is
 * met where the clause is met, else the first that is not.
 */
export function listFindingRows(evidence: EvidenceFile): FindingRow[] {
  const receptors = new Map(
    evidence.receptors.features.map(({ properties }) => [properties.id, properties]),
  );
  const clauseTitles = new Map(evidence.rule.clauses.map(({ id, title }) => [id, title]));
  return evidence.results.receptors.flatMap((result) =>
    result.clauses.map((clause): FindingRow => {
      const receptor = receptors.get(result.id);
      const test = findDecidingTest(clause);
      if (test === undefined) {
        throw new Error(`${result.id} is judged under ${clause.clause} without a test.`);
      }
      return {
        receptor: result.id,
        // A ring is made by the engine and stands in no list of receptors.
        label: receptor?.label ?? 'Ground around the site',
        class: receptor?.class ?? 'ring',
        clause: clause.clause,
        clauseTitle: clauseTitles.get(clause.clause) ?? clause.clause,
        day: clause.day,
        finding: clause.finding,
        close: clause.close,
        measure: test.measure,
        unit: test.unit,
        before: test.before,
        after: test.after,
        lost: roundTo(test.before - test.after, 1e4),
        limit: test.limit,
        margin: test.margin,
        loss: clause.loss,
        band: clause.band,
        daysNotMet: clause.daysNotMet ?? null,
        spacingM: clause.spacingM,
        sentence: clause.note,
      };
    }),
  );
}

function findDecidingTest({ finding, tests }: ClauseResult): ClauseTest | undefined {
  const isMet = finding === 'met' || finding === 'not-affected';
  return tests.find((test) => test.met === isMet) ?? tests[0];
}

/** A difference of two rounded figures carries no more digits than they do. */
function roundTo(value: number, steps: number): number {
  return Math.round(value * steps) / steps;
}
