import { Link } from 'react-router-dom';
import type { RuleVersion } from '../../../../shared/contracts/rules.ts';
import { paths } from '../../../app/paths.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { versionStateWords } from '../rule-words.ts';

/** The versions with their states, and who wrote them and put them in force. */
export function RuleVersionsTable({ versions }: { versions: readonly RuleVersion[] }) {
  const formats = useFormats();
  const isToStaff = versions.some(({ abilities }) => abilities.length > 0);
  return (
    <DataTable
      caption="Versions of the rule"
      hideCaption
      columns={versionColumns(formats, isToStaff)}
      rows={versions}
      rowKey={({ id }) => id}
      stacksWhenNarrow
    />
  );
}

function versionColumns(formats: Formats, isToStaff: boolean): TableColumn<RuleVersion>[] {
  const say = (deed: RuleVersion['created'] | null) =>
    deed === null
      ? '–'
      : [formats.shortDateOfInstant(deed.at), deed.by].filter((one) => one !== null).join(', ');
  return [
    {
      id: 'version',
      header: 'Version',
      isRowHeader: true,
      cell: ({ id, rule }) => (
        <Link to={paths.rule.href(id)} className="link">
          Version {rule.version}: {rule.title}
        </Link>
      ),
    },
    { id: 'state', header: 'State', cell: ({ state }) => <StateWords state={state} /> },
    {
      id: 'from',
      header: 'In force from',
      cell: ({ inForceFrom }) => (inForceFrom === null ? '–' : formats.date(inForceFrom)),
    },
    {
      id: 'clauses',
      header: 'Clauses',
      cell: ({ rule }) => formats.number(rule.clauses.length),
    },
    { id: 'created', header: 'Written', cell: ({ created }) => say(created) },
    ...(isToStaff
      ? [
          {
            id: 'changed',
            header: 'Changed',
            cell: ({ changed }: RuleVersion) => say(changed),
          },
          {
            id: 'enacted',
            header: 'Put in force',
            cell: ({ enacted }: RuleVersion) => say(enacted),
          },
        ]
      : []),
  ];
}

function StateWords({ state }: Pick<RuleVersion, 'state'>) {
  return (
    <span className={state === 'in-force' ? 'font-strong' : ''}>{versionStateWords[state]}</span>
  );
}
