import {
  judgedClassSchema,
  type FindingsSummary,
  type JudgedClass,
} from '../../../../shared/contracts/studies.ts';
import { findingSchema, type Finding } from '../../../../shared/study/evidence-schema.ts';
import { Button } from '../../../components/button.tsx';
import { SearchForm } from '../../../components/search-form.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { wordOfClass } from '../receptor-words.ts';

const every = 'all';

const findingOptions: { id: Finding | typeof every; label: string }[] = [
  { id: every, label: 'Every finding' },
  { id: 'not-met', label: 'Not met' },
  { id: 'met', label: 'Met' },
  { id: 'disregarded', label: 'Too little to count' },
  { id: 'not-affected', label: 'Not affected' },
];

/** What the findings table is narrowed to. */
export interface FindingsFilterValues {
  q?: string;
  finding?: Finding;
  clause?: string;
  class?: JudgedClass;
}

/** The filters of the findings table, kept in the address; a change goes back to the first page. */
export function useFindingsFilter() {
  const [q, setQuery] = useSearchState('q');
  const [findingText, setFinding] = useSearchState('finding');
  const [clause, setClause] = useSearchState('clause');
  const [classText, setClass] = useSearchState('class');
  const [, setPage] = useSearchState('page');
  const finding = findingSchema.safeParse(findingText).data;
  const receptorClass = judgedClassSchema.safeParse(classText).data;
  const values: FindingsFilterValues = {
    ...(q === null ? {} : { q }),
    ...(finding === undefined ? {} : { finding }),
    ...(clause === null ? {} : { clause }),
    ...(receptorClass === undefined ? {} : { class: receptorClass }),
  };
  const onFirstPage = (set: (value: string | null) => void) => (value: string | null) => {
    set(value);
    setPage(null);
  };
  return {
    values,
    setQuery: onFirstPage(setQuery),
    setFinding: onFirstPage(setFinding),
    setClause: onFirstPage(setClause),
    setClass: onFirstPage(setClass),
    clear: () => {
      for (const set of [setQuery, setFinding, setClause, setClass, setPage]) set(null);
    },
  };
}

export interface FindingsFilterProps {
  filter: ReturnType<typeof useFindingsFilter>;
  summary: FindingsSummary;
}

/** Narrows the findings by words, finding, clause and kind of receptor. */
export function FindingsFilter({ filter, summary }: FindingsFilterProps) {
  const { q, finding, clause, class: receptorClass } = filter.values;
  const { clauses, classes } = summary;
  const orNull = (value: string) => (value === every ? null : value);
  return (
    <div className="no-print flex flex-wrap items-end gap-x-6 gap-y-3">
      <div className="grow basis-72">
        <SearchForm
          key={q ?? ''}
          label="Find in the findings"
          value={q ?? ''}
          placeholder="Address, parcel or words"
          onSearch={filter.setQuery}
        />
      </div>
      <SelectField
        label="Finding"
        options={findingOptions}
        value={finding ?? every}
        onChange={(next) => filter.setFinding(orNull(next))}
        className="w-52 max-w-full"
      />
      {clauses.length < 2 ? null : (
        <SelectField
          label="Clause"
          options={[
            { id: every, label: 'Every clause' },
            ...clauses.map((one) => ({ id: one.clause, label: one.title })),
          ]}
          value={clause ?? every}
          onChange={(next) => filter.setClause(orNull(next))}
          className="w-72 max-w-full"
        />
      )}
      {classes.length < 2 ? null : (
        <SelectField
          label="Kind of receptor"
          options={[
            { id: every, label: 'Every kind' },
            ...classes.map((one) => ({ id: one, label: wordOfClass(one) })),
          ]}
          value={receptorClass ?? every}
          onChange={(next) => filter.setClass(orNull(next))}
          className="w-52 max-w-full"
        />
      )}
      {Object.keys(filter.values).length === 0 ? null : (
        <Button kind="plain" className="py-2" onPress={filter.clear}>
          Show everything
        </Button>
      )}
    </div>
  );
}
