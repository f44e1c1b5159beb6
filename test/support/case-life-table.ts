import { caseStates, type CaseState } from '../../shared/contracts/case-life.ts';
import type { Role } from '../../shared/contracts/people.ts';

/**
 * The life of a case, written out by hand from the product's description: from the state of the row
 * to the state of the column. a: the applicant, p: a planner, b: both, -: nobody.
 * The columns stand in the order of the rows.
 */
const table = `
                         dr su sb co ur oc ri cn he ap ac re al rm wd
draft                     -  a  -  -  -  -  -  -  -  -  -  -  -  -  b
submitted                 -  -  p  p  -  -  -  -  -  -  -  -  -  -  b
sent-back                 -  a  -  -  -  -  -  -  -  -  -  -  -  -  b
complete                  -  -  p  -  p  -  -  -  -  -  -  -  -  -  b
under-review              -  -  p  -  -  p  -  -  -  -  -  -  -  -  b
open-for-comment          -  -  -  -  -  -  p  -  -  -  -  -  -  -  b
report-issued             -  -  -  -  -  -  -  p  p  -  -  -  -  -  b
continued                 -  -  -  -  -  -  p  -  -  -  -  -  -  -  b
heard                     -  -  -  -  -  -  -  p  -  p  p  p  -  -  b
approved                  -  -  -  -  -  -  -  -  -  -  -  -  p  p  -
approved-with-conditions  -  -  -  -  -  -  -  -  -  -  -  -  p  p  -
refused                   -  -  -  -  -  -  -  -  -  -  -  -  p  p  -
appealed                  -  -  -  -  -  -  -  -  -  -  -  -  -  -  b
remanded                  -  -  -  -  p  -  -  -  -  -  -  -  -  -  b
withdrawn                 -  -  -  -  -  -  -  -  -  -  -  -  -  -  -
`;

const rolesByLetter: Record<string, readonly Role[]> = {
  a: ['applicant'],
  p: ['planner'],
  b: ['applicant', 'planner'],
  '-': [],
};

/** Every pair of states with the roles that may take a case from the one to the other. */
export const caseSteps: readonly { from: CaseState; to: CaseState; by: readonly Role[] }[] =
  readRows(table).flatMap(({ name: from, cells }, _index, rows) =>
    cells.map((letter, column) => {
      const to = rows[column]?.name;
      const by = rolesByLetter[letter];
      if (to === undefined || by === undefined) throw new Error(`The row of ${from} is wrong.`);
      return { from: stateOf(from), to: stateOf(to), by };
    }),
  );

/** The rows of a table below its heading: a name, then one cell for each column. */
export function readRows(text: string): { name: string; cells: string[] }[] {
  const [heading, ...lines] = text.trim().split('\n');
  const columns = heading?.trim().split(/\s+/).length;
  return lines.map((line) => {
    const [name = '', ...cells] = line.trim().split(/\s+/);
    if (cells.length !== columns) throw new Error(`The row of ${name} has ${cells.length} cells.`);
    return { name, cells };
  });
}

/** The state of this name, as a table writes it. */
export function stateOf(name: string): CaseState {
  const state = caseStates.find((one) => one === name);
  if (state === undefined) throw new Error(`${name} is no state.`);
  return state;
}
