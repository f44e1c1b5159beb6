import { useMemo } from 'react';
import type { FindingRow, StudyDetail } from '../../../../shared/contracts/studies.ts';
import type { LngLat, Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { sunPositionAt } from '../../../../shared/solar/sun-position.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useFormats, usePlace } from '../../../lib/place-context.ts';
import type { ShadowLayer } from '../../../map/case-layers.ts';
import type { MapPin } from '../../../map/map-features.ts';
import { SunArc } from '../../../map/sun-arc.tsx';
import type { useStudyView } from '../../../map/use-study-view.ts';
import { useReceptor } from '../api/get-receptor.ts';
import { useShadows } from '../api/get-shadows.ts';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { ledgerDayOf, samplesOf } from '../ledger-day.ts';
import { DateChoice } from './date-choice.tsx';
import { StudyMap } from './study-map.tsx';

export interface StudySheetProps {
  /** Finished. */
  study: StudyDetail;
  site: Polygonal | null;
  evidence: DrawnEvidence;
  /** Every finding of the study. */
  rows: readonly FindingRow[];
  /** Date, instant and layer, as the address has them. */
  view: ReturnType<typeof useStudyView>;
  chosen: string | null;
  /** A receptor and the place at which the person pointed. */
  onChoose: (receptor: string, lngLat: LngLat) => void;
  pins?: readonly MapPin[];
  /** Where the same stands as a table. */
  tableId: string;
}

const layers = [
  { id: 'before', label: 'Before' },
  { id: 'after', label: 'After' },
  { id: 'net-new', label: 'Net new difference' },
] as const satisfies readonly { id: ShadowLayer; label: string }[];

/** A finished study to look at hour by hour: the map over the sun arc. */
export function StudySheet({
  study,
  site,
  evidence,
  rows,
  view,
  chosen,
  onChoose,
  pins,
  tableId,
}: StudySheetProps) {
  const formats = useFormats();
  const { municipality } = usePlace();
  const { date, day, steps, atMs, askedAt, layer, change } = view;
  const shadows = useShadows(study.id, askedAt);
  const receptor = useReceptor(study.id, chosen);
  const ledgerDay = ledgerDayOf(receptor.data?.ledger, date);
  const samples = useMemo(() => (ledgerDay === null ? null : samplesOf(ledgerDay)), [ledgerDay]);
  const sun = sunPositionAt(atMs, municipality.longitude, municipality.latitude);
  const isDrawn = shadows.data !== undefined && Date.parse(shadows.data.at) === atMs;

  return (
    <section aria-label="Map and time of day" className="grid content-start gap-3">
      <ChoiceRow
        label="What the map shows"
        options={layers}
        value={layer}
        onChange={(next) => change({ layer: next })}
      />
      <StudyMap
        study={study}
        site={site}
        evidence={evidence}
        rows={rows}
        shadows={steps === null ? null : (shadows.data ?? null)}
        layer={layer}
        chosen={chosen}
        onChoose={onChoose}
        {...(pins === undefined ? {} : { pins })}
      />
      <DateChoice
        keyDates={study.keyDates}
        value={date}
        onChange={(next) => change({ date: next })}
      />
      {steps === null ? (
        <p>The sun does not rise on {formats.date(date)}.</p>
      ) : (
        <SunArc
          day={day}
          steps={steps}
          atMs={atMs}
          altitudeDeg={sun.altitudeDeg}
          onChange={view.setInstant}
          windows={view.windows}
          samples={samples}
        />
      )}
      <p role="status" className="min-h-5 text-small text-ink-soft">
        {shadows.isError
          ? ''
          : isDrawn
            ? describeNetNew(study, shadows.data.at, formats)
            : 'Drawing …'}
      </p>
      {shadows.isError ? (
        <ProblemNotice error={shadows.error} onRetry={() => void shadows.refetch()} />
      ) : null}
      <MapKey />
      <p className="text-small">
        Point at a receptor to read its account, or choose it in{' '}
        <a href={`#${tableId}`} className="link">
          the table that says the same
        </a>
        .
      </p>
    </section>
  );
}

function describeNetNew(
  study: StudyDetail,
  at: string,
  formats: ReturnType<typeof useFormats>,
): string {
  const instant = study.instants.find((one) => Date.parse(one.at) === Date.parse(at));
  if (instant === undefined || instant.netNewM2 === null) return '';
  return `At ${formats.clockWithZone(at)} the proposal shades ${formats.area(instant.netNewM2)} of ground anew.`;
}

/** What the map's signs mean. */
function MapKey() {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-small" aria-label="Key of the map">
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border border-slate bg-slate/35" />
        shadow
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="hatched inline-block h-3 w-4 border border-madder" />
        net new shadow
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border-2 border-ink bg-sheet" />
        proposal
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="font-strong text-madder">
          ✕
        </span>
        rule not met
      </li>
      <li className="flex items-center gap-1.5">
        <span aria-hidden="true" className="inline-block h-3 w-4 border-2 border-marigold" />
        chosen receptor
      </li>
    </ul>
  );
}
