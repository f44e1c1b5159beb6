import type { MassingSummary } from '../../../../shared/contracts/massings.ts';
import { Button } from '../../../components/button.tsx';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface RevisionTableProps {
  reference: string;
  revisions: readonly MassingSummary[];
  /** The revision that is looked at. */
  shown: number | null;
  onShow: (revision: number) => void;
}

/** Every massing revision, the latest first; none is ever changed. */
export function RevisionTable({ reference, revisions, shown, onShow }: RevisionTableProps) {
  const formats = useFormats();
  return (
    <DataTable
      caption="Stored massing revisions"
      hideCaption
      columns={revisionColumns(reference, formats, onShow)}
      rows={revisions}
      stacksWhenNarrow
      rowKey={(row) => String(row.revision)}
      isRowSelected={(row) => row.revision === shown}
    />
  );
}

function revisionColumns(
  reference: string,
  formats: Formats,
  onShow: (revision: number) => void,
): TableColumn<MassingSummary>[] {
  return [
    {
      id: 'revision',
      header: 'Revision',
      isRowHeader: true,
      cell: (row) => (
        <Button kind="plain" onPress={() => onShow(row.revision)}>
          Revision {row.revision}
        </Button>
      ),
    },
    {
      id: 'file',
      header: 'File, and what proves it',
      className: 'min-w-64',
      cell: (row) => (
        <>
          <a
            className="link"
            href={`/api/cases/${reference}/massings/${row.revision}/original`}
            download={row.fileName}
          >
            {row.fileName}
          </a>{' '}
          <span className="text-ink-soft">({formats.fileSize(row.sizeBytes)})</span>
          <span className="block font-mono text-[0.6875rem] break-all text-ink-soft">
            SHA-256 {row.sha256}
          </span>
        </>
      ),
    },
    {
      id: 'sent',
      header: 'Sent',
      className: 'min-w-36',
      cell: (row) => (
        <>
          {formats.instant(row.uploadedAt)}
          <span className="block text-ink-soft">{row.uploadedByName}</span>
        </>
      ),
    },
    {
      id: 'height',
      header: 'Height',
      align: 'end',
      cell: (row) =>
        row.figures.heightM === null ? 'not known' : formats.length(row.figures.heightM),
    },
    {
      id: 'sound',
      header: 'Check',
      className: 'whitespace-nowrap',
      cell: (row) =>
        row.sound ? (
          <>
            <span aria-hidden="true">✓ </span>sound
          </>
        ) : (
          <span className="font-strong text-madder">
            <span aria-hidden="true">✕ </span>to correct
          </span>
        ),
    },
  ];
}
