import { useState } from 'react';
import { DataTable, type TableColumn } from '../../components/data-table.tsx';
import { DefinitionList } from '../../components/definition-list.tsx';
import { FindingMark, type FindingMarkValue } from '../../components/finding-mark.tsx';
import { TitleStrip } from '../../components/title-strip.tsx';
import { useFormats } from '../../lib/place-context.ts';
import { DesignSection, Specimen } from './design-section.tsx';

interface Row {
  address: string;
  lostHours: number;
  finding: FindingMarkValue;
  close?: boolean;
}

const rows: Row[] = [
  { address: '12 Netloft Lane', lostHours: 2.17, finding: 'not-met' },
  { address: '14 Netloft Lane', lostHours: 1.35, finding: 'met', close: true },
  { address: '2 Eelgate Court', lostHours: 0.4, finding: 'met' },
  { address: '4 Eelgate Court', lostHours: 0.02, finding: 'disregarded' },
  { address: '6 Eelgate Court', lostHours: 0, finding: 'not-affected' },
];

export function TablesSection() {
  const formats = useFormats();
  const [sort, setSort] = useState('-lost');
  const columns: TableColumn<Row>[] = [
    { id: 'address', header: 'Receptor', isRowHeader: true, cell: (row) => row.address },
    {
      id: 'lost',
      header: 'Lost',
      align: 'end',
      sortKey: 'lost',
      cell: (row) => formats.hours(row.lostHours),
    },
    {
      id: 'finding',
      header: 'Rule',
      cell: (row) => <FindingMark finding={row.finding} close={row.close === true} />,
    },
  ];
  const sign = sort.startsWith('-') ? -1 : 1;
  const sorted = rows.toSorted((a, b) => sign * (a.lostHours - b.lostHours));
  return (
    <DesignSection title="Tables and facts">
      <TitleStrip
        entries={[
          { label: 'Case', value: '2026-0001' },
          { label: 'Site', value: '2 Eelgate Court' },
          { label: 'Proposal', value: '14 storeys, 44.0 m high' },
          { label: 'Finding', value: <FindingMark finding="not-met" /> },
        ]}
      />
      <div className="grid gap-8 lg:grid-cols-2">
        <DataTable
          caption="Sorted, with a chosen row"
          columns={columns}
          rows={sorted}
          rowKey={(row) => row.address}
          sort={sort}
          onSort={setSort}
          isRowSelected={(row) => row.address === '14 Netloft Lane'}
        />
        <DataTable
          caption="Rows that become short lists where it is narrow"
          columns={columns.map(({ sortKey: _sortKey, ...column }) => column)}
          rows={rows}
          rowKey={(row) => row.address}
          stacksWhenNarrow
        />
        <Specimen name="facts one under the other">
          <DefinitionList
            entries={[
              { label: 'Height', value: formats.length(44) },
              { label: 'Footprint', value: formats.area(1240) },
              { label: 'Volume', value: formats.volume(21_600) },
            ]}
          />
        </Specimen>
        <Specimen name="outcomes under a rule">
          <p className="flex flex-wrap gap-x-6 gap-y-2">
            <FindingMark finding="met" />
            <FindingMark finding="met" close />
            <FindingMark finding="not-met" />
            <FindingMark finding="not-met" close />
            <FindingMark finding="disregarded" />
            <FindingMark finding="not-affected" />
            <FindingMark finding="no-receptor" />
          </p>
        </Specimen>
      </div>
    </DesignSection>
  );
}
