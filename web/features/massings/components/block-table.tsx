import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import type { DrawnBlock } from '../drawn-block.ts';

/** The blocks with their heights, from the highest down. */
export function BlockTable({ blocks }: { blocks: readonly DrawnBlock[] }) {
  const formats = useFormats();
  return (
    <DataTable
      caption="Blocks"
      columns={blockColumns(formats)}
      rows={blocks.toSorted((a, b) => b.topM - a.topM)}
      stacksWhenNarrow
      rowKey={(block) => block.id}
    />
  );
}

function blockColumns(formats: Formats): TableColumn<DrawnBlock>[] {
  return [
    {
      id: 'id',
      header: 'Block',
      isRowHeader: true,
      cell: (block) => (block.name === null ? block.id : `${block.name} (${block.id})`),
    },
    {
      id: 'role',
      header: 'Part',
      cell: (block) => (block.role === 'proposed' ? 'proposed' : 'stands today, removed'),
    },
    { id: 'base', header: 'Base', align: 'end', cell: (block) => formats.length(block.baseM) },
    { id: 'top', header: 'Top', align: 'end', cell: (block) => formats.length(block.topM) },
    { id: 'storeys', header: 'Storeys', align: 'end', cell: (block) => block.storeys ?? '–' },
  ];
}
