import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../../components/button.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { SearchForm } from '../../components/search-form.tsx';
import { useCases } from '../../features/cases/api/list-cases.ts';
import { CaseList } from '../../features/cases/components/case-list.tsx';
import { NearbyCases } from '../../features/cases/components/nearby-cases.tsx';
import { useParcels } from '../../features/places/api/list-parcels.ts';
import { usePlace } from '../../lib/place-context.ts';
import { useSearchState } from '../../lib/use-search-state.ts';
import { CaseMap } from '../../map/case-map.tsx';
import { paths } from '../paths.ts';

const mostCases = 200;
const mostParcels = 6;

/** Open cases as a list and on a map, found by address, parcel or case number. */
export function HomePage() {
  const { municipality } = usePlace();
  const navigate = useNavigate();
  const [search, setSearch] = useSearchState('q');
  const words = search ?? '';
  const cases = useCases({ q: words, view: 'public', pageSize: mostCases });
  const allCases = useCases({ view: 'public', pageSize: mostCases });
  const parcels = useParcels({ q: words, pageSize: mostParcels }, { enabled: words !== '' });
  const foundParcels = words === '' ? [] : (parcels.data?.rows ?? []);
  // Where no case matches, the map still shows them all: the address may lie beside one.
  const rows = cases.data?.total === 0 ? allCases.data?.rows : cases.data?.rows;
  const pins = useMemo(
    () =>
      (rows ?? []).flatMap(({ reference, title, sitePoint }) =>
        sitePoint === null ? [] : [{ id: reference, lngLat: sitePoint, label: title }],
      ),
    [rows],
  );

  return (
    <div className="sheet-width grid gap-x-10 gap-y-6 py-8 lg:grid-cols-[minmax(0,5fr)_minmax(0,6fr)]">
      <div className="grid content-start gap-6">
        <div className="grid gap-3">
          <PageHeading>Open cases</PageHeading>
          <p className="measure text-lead">
            Buildings proposed in {municipality.shortName}, and the sun that each would take from
            its neighbours. Find yours by your own address.
          </p>
        </div>
        <SearchForm
          key={words}
          label="Address, parcel or case number"
          value={words}
          onSearch={setSearch}
        />
        {foundParcels.length > 0 && (allCases.data?.rows.length ?? 0) > 0 ? (
          <section className="grid gap-2" aria-labelledby="found-addresses">
            <h2 id="found-addresses">Your address</h2>
            <NearbyCases parcels={foundParcels} cases={allCases.data?.rows ?? []} />
          </section>
        ) : null}
        <section className="grid gap-2" aria-labelledby="found-cases">
          <h2 id="found-cases" className="sr-only">
            Cases
          </h2>
          <QueryView query={cases} what="the cases">
            {(page) =>
              page.rows.length === 0 ? (
                <NoCases
                  words={words}
                  hasParcels={foundParcels.length > 0}
                  onClear={() => setSearch(null)}
                />
              ) : (
                <>
                  <p className="text-small text-ink-soft" role="status">
                    {page.total === 1 ? 'One case' : `${page.total} cases`}
                    {words === '' ? '' : ` for “${words}”`}
                  </p>
                  <CaseList
                    cases={page.rows}
                    hrefOf={({ reference }) => paths.publicCase.href(reference)}
                  />
                </>
              )
            }
          </QueryView>
        </section>
      </div>
      <div className="no-print lg:sticky lg:top-6 lg:self-start">
        <CaseMap
          label="Map of the open cases"
          bounds={municipality.extent}
          pins={pins}
          mode="pick"
          onPick={({ pin }) => {
            if (pin !== null) void navigate(paths.publicCase.href(pin));
          }}
          className="h-[55vh] min-h-80 lg:h-[72vh]"
          alternative={
            <p className="text-ink-soft">Every pin is a case in the list. Pick a pin to open it.</p>
          }
        />
      </div>
    </div>
  );
}

interface NoCasesProps {
  words: string;
  /** Addresses were found, and stand above. */
  hasParcels: boolean;
  onClear: () => void;
}

function NoCases({ words, hasParcels, onClear }: NoCasesProps) {
  if (words === '') {
    return (
      <EmptyState title="No case is open at the moment.">
        <p>Cases appear here when the planning department publishes them for comment.</p>
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title={hasParcels ? `No case stands at “${words}” itself.` : `Nothing matches “${words}”.`}
    >
      {hasParcels ? null : (
        <p>Try the street without the house number, or look through all open cases.</p>
      )}
      <Button onPress={onClear}>Show all open cases</Button>
    </EmptyState>
  );
}
