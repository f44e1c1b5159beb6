import { useState } from 'react';
import type {
  RuleTrial,
  TrialClauseSide,
  TrialRow,
} from '../../../../shared/contracts/rule-trials.ts';
import { CheckboxField } from '../../../components/checkbox-field.tsx';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import { Pager } from '../../../components/pager.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useFormats } from '../../../lib/place-context.ts';
import { trialColumns } from './trial-columns.tsx';

const everyClause = 'all';
const pageSize = 50;

/** A case judged by the draft beside the version in force: the whole, clause by clause, place by place. */
export function RuleTrialView({ trial }: { trial: RuleTrial }) {
  const formats = useFormats();
  const [words, setWords] = useState('');
  const [clause, setClause] = useState(everyClause);
  const [isWhole, setIsWhole] = useState(false);
  const [page, setPage] = useState(1);
  const changed = trial.rows.filter(({ change }) => change !== 'same');
  const shown = (isWhole ? trial.rows : changed).filter(
    (row) =>
      (clause === everyClause || row.clause === clause) &&
      `${row.label} ${row.receptor}`.toLowerCase().includes(words.trim().toLowerCase()),
  );
  return (
    <div className="grid gap-6">
      <section className="grid gap-3" aria-label="Outcome">
        <p className="say text-lead">{describeOutcome(trial)}</p>
        <DataTable
          caption="Clause by clause"
          columns={clauseColumns(trial)}
          rows={trial.clauses}
          rowKey={(row) => row.clause}
          stacksWhenNarrow
        />
        <p className="text-small">
          Loss index: {formats.number(trial.inForce.lossIndex, 1)} by version{' '}
          {trial.inForce.version}, {formats.number(trial.draft.lossIndex, 1)} by version{' '}
          {trial.draft.version}, of 100.
        </p>
      </section>
      <section className="grid gap-3" aria-labelledby="trial-places">
        <h3 id="trial-places">Place by place</h3>
        <div className="no-print flex flex-wrap items-end gap-x-6 gap-y-3">
          <TextField
            label="Find a receptor"
            className="grow"
            value={words}
            onChange={(next) => {
              setWords(next);
              setPage(1);
            }}
          />
          <SelectField
            label="Clause"
            className="w-72 max-w-full"
            options={[
              { id: everyClause, label: 'Every clause' },
              ...trial.clauses.map((one) => ({ id: one.clause, label: one.title })),
            ]}
            value={clause}
            onChange={(next) => {
              setClause(next);
              setPage(1);
            }}
          />
          <CheckboxField
            label="Also what stays the same"
            isSelected={isWhole}
            onChange={(next) => {
              setIsWhole(next);
              setPage(1);
            }}
          />
        </div>
        <p className="text-small" role="status">
          {changed.length === 0
            ? 'Nothing changes at any place.'
            : `${changed.length} of ${trial.rows.length} rows change.`}{' '}
          {shown.length} shown.
        </p>
        {shown.length === 0 ? null : (
          <DataTable<TrialRow>
            caption="Findings by the version in force and by the draft"
            hideCaption
            columns={trialColumns(formats, trial)}
            rows={shown.slice((page - 1) * pageSize, page * pageSize)}
            rowKey={(row) => `${row.clause} ${row.receptor}`}
            stacksWhenNarrow
          />
        )}
        <Pager page={page} pageSize={pageSize} total={shown.length} onPage={setPage} />
      </section>
    </div>
  );
}

function describeOutcome({ inForce, draft, rows }: RuleTrial): string {
  const count = (change: TrialRow['change']) => rows.filter((row) => row.change === change).length;
  const places = (number: number) =>
    number === 0 ? 'No finding' : number === 1 ? '1 finding' : `${number} findings`;
  const met = (side: RuleTrial['draft']) => (side.met ? 'meets' : 'does not meet');
  return [
    `The case ${met(inForce)} version ${inForce.version}, which is in force, and ${met(draft)} version ${draft.version}.`,
    `${places(count('worse'))} would turn to not met.`,
    `${places(count('better'))} would cease to be not met.`,
  ].join(' ');
}

function clauseColumns({ inForce, draft }: RuleTrial): TableColumn<RuleTrial['clauses'][number]>[] {
  return [
    { id: 'clause', header: 'Clause', isRowHeader: true, cell: ({ title }) => title },
    {
      id: 'in-force',
      header: `Version ${inForce.version}, in force`,
      cell: (row) => <ClauseSide side={row.inForce} />,
    },
    {
      id: 'draft',
      header: `Version ${draft.version}, tried`,
      cell: (row) => <ClauseSide side={row.draft} />,
    },
  ];
}

function ClauseSide({ side }: { side: TrialClauseSide | null }) {
  if (side === null) return <span className="text-ink-soft">has no such clause</span>;
  return (
    <>
      <FindingMark finding={side.finding} />
      {side.judged === 0 ? '' : `, ${side.notMet} of ${side.judged} not met`}
    </>
  );
}
