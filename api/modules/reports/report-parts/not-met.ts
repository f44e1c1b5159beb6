import type { FindingRow } from '../../../../shared/contracts/studies.ts';
import type { ReportPayload } from '../report-payload.ts';
import { compareAddresses } from './addresses.ts';

/** A receptor that doesn't meet at least one clause. */
export interface NotMetReceptor {
  /** From 1 on; marks the receptor on maps and in tables. */
  number: number;
  receptor: string;
  label: string;
  class: string;
  /** Its rows with the finding `not-met`, in the order of the rule's clauses. */
  rows: FindingRow[];
}

/**
 * Every receptor that doesn't meet a clause, street by street. This list cannot be edited: it is
 * checked against the study's own findings, receptor by receptor.
 *
 * @throws when the payload's rows and the study's findings disagree
 */
export function listNotMet({ findingRows, study, municipality }: ReportPayload): NotMetReceptor[] {
  const failing = findingRows.filter(({ finding }) => finding === 'not-met');
  for (const clause of study.findings.clauses) {
    const listed = new Set(
      failing.filter((row) => row.clause === clause.clause).map((row) => row.receptor),
    );
    const found = new Set(clause.receptorsNotMet);
    const missing = [...found].filter((id) => !listed.has(id));
    const extra = [...listed].filter((id) => !found.has(id));
    if (missing.length > 0 || extra.length > 0) {
      throw new Error(
        `The rows of ${clause.clause} and the study's findings disagree at ${[...missing, ...extra].join(', ')}.`,
      );
    }
  }

  const byReceptor = new Map<string, FindingRow[]>();
  for (const row of failing) {
    byReceptor.set(row.receptor, [...(byReceptor.get(row.receptor) ?? []), row]);
  }
  const compare = compareAddresses(municipality.locale);
  return [...byReceptor.entries()]
    .flatMap(([receptor, rows]) => {
      const [first] = rows;
      return first === undefined
        ? []
        : [{ receptor, label: first.label, class: first.class, rows }];
    })
    .sort((a, b) => compare(a.label, b.label) || (a.receptor < b.receptor ? -1 : 1))
    .map((one, index) => ({ number: index + 1, ...one }));
}
