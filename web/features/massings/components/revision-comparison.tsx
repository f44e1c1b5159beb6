import { useState } from 'react';
import type { MassingComparison, MassingSummary } from '../../../../shared/contracts/massings.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { useMassingComparison } from '../api/compare-massings.ts';

export interface RevisionComparisonProps {
  reference: string;
  /** At least two, the latest first. */
  revisions: readonly MassingSummary[];
}

type ComparedBlock = MassingComparison['blocks'][number];

const changeWords = {
  added: 'added',
  removed: 'removed',
  changed: 'changed',
  same: 'as before',
} as const satisfies Record<ComparedBlock['change'], string>;

/** What changed from one revision to another: in figures, and block by block. */
export function RevisionComparison({ reference, revisions }: RevisionComparisonProps) {
  const formats = useFormats();
  const [from, setFrom] = useState(String(revisions[1]?.revision ?? 1));
  const [to, setTo] = useState(String(revisions[0]?.revision ?? 1));
  const comparison = useMassingComparison(reference, Number(from), Number(to));
  const options = revisions.map(({ revision }) => ({
    id: String(revision),
    label: `Revision ${revision}`,
  }));
  return (
    <div className="grid gap-4">
      <div className="grid max-w-md grid-cols-2 gap-4">
        <SelectField label="From" options={options} value={from} onChange={setFrom} />
        <SelectField label="To" options={options} value={to} onChange={setTo} />
      </div>
      <QueryView query={comparison} what="the comparison">
        {({ blocks, figuresBefore, figuresAfter }) => (
          <>
            <p>
              Height {heightOf(figuresBefore.heightM, formats)} before,{' '}
              {heightOf(figuresAfter.heightM, formats)} after.{' '}
              {blocks.every(({ change }) => change === 'same')
                ? 'No block has changed.'
                : `${blocks.filter(({ change }) => change !== 'same').length} of ${blocks.length} blocks differ.`}
            </p>
            <DataTable
              caption={`Blocks of revision ${from} and revision ${to}`}
              hideCaption
              columns={comparisonColumns(formats)}
              rows={blocks}
              stacksWhenNarrow
              rowKey={(block) => `${block.id} ${block.change}`}
            />
          </>
        )}
      </QueryView>
    </div>
  );
}

function comparisonColumns(formats: Formats): TableColumn<ComparedBlock>[] {
  const figures = (block: ComparedBlock['before']) =>
    block === null
      ? '–'
      : [
          `${formats.length(block.baseM)} to ${formats.length(block.topM)}`,
          block.footprintM2 === null ? null : formats.area(block.footprintM2),
        ]
          .filter((part) => part !== null)
          .join(', ');
  return [
    { id: 'id', header: 'Block', isRowHeader: true, cell: (block) => block.id },
    {
      id: 'change',
      header: 'Change',
      cell: (block) => (
        <span className={block.change === 'same' ? 'text-ink-soft' : 'font-strong'}>
          {changeWords[block.change]}
        </span>
      ),
    },
    {
      id: 'before',
      header: 'Before: base to top, footprint',
      cell: (block) => figures(block.before),
    },
    { id: 'after', header: 'After', cell: (block) => figures(block.after) },
  ];
}

function heightOf(heightM: number | null, formats: Formats): string {
  return heightM === null ? 'not known' : formats.length(heightM);
}
