import { useMemo } from 'react';
import type { FindingRow, StudyDetail } from '../../../../shared/contracts/studies.ts';
import type { LngLat, Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { sunPositionAt } from '../../../../shared/solar/sun-position.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useFormats, usePlace } from '../../../lib/place-context.ts';
import type { ShadowLayer } from '../../../map/case-layers.ts';
import type { MapPin } from '../../../map/map-features.ts';
import { PlayDay } from '../../../map/play-day.tsx';
import { SunArc } from '../../../map/sun-arc.tsx';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { samplesOf } from '../ledger-day.ts';
import { useInstantShadows, type ShownShadows } from '../live/use-instant-shadows.ts';
import { useReceptorDay } from '../use-receptor-day.ts';
import type { StudyLook } from '../use-study-look.ts';
import { DateChoice } from './date-choice.tsx';
import { JudgedHoursNote } from './judged-hours-note.tsx';
import { MapKey } from './map-key.tsx';
import { StudyMap } from './study-map.tsx';

export interface StudySheetProps {
  /** Finished. */
  study: StudyDetail;
  site: Polygonal | null;
  evidence: DrawnEvidence;
  /** Every finding of the study. */
  rows: readonly FindingRow[];
  /** Date, instant and layer, as the address has them, and the engine that draws them. */
  look: StudyLook;
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
  look,
  chosen,
  onChoose,
  pins,
  tableId,
}: StudySheetProps) {
  const formats = useFormats();
  const { municipality } = usePlace();
  const { view, live } = look;
  const { date, day, steps, atMs, at, askedAt, layer, change } = view;
  const shown = useInstantShadows(live, study.id, at, askedAt);
  const ledgerDay = useReceptorDay(live, study.id, chosen, date);
  const samples = useMemo(() => (ledgerDay === null ? null : samplesOf(ledgerDay)), [ledgerDay]);
  const sun = sunPositionAt(atMs, municipality.longitude, municipality.latitude);
  const isDrawn = shown.shadows !== null && Date.parse(shown.shadows.at) === atMs;

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
        shadows={steps === null ? null : shown.shadows}
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
      <JudgedHoursNote windows={view.windows} />
      {steps === null ? (
        <p>The sun does not rise on {formats.date(date)}.</p>
      ) : (
        <>
          <SunArc
            day={day}
            steps={steps}
            atMs={atMs}
            altitudeDeg={sun.altitudeDeg}
            onChange={view.setInstant}
            windows={view.windows}
            samples={samples}
          />
          <PlayDay
            key={date}
            steps={steps}
            atMs={atMs}
            isDrawn={isDrawn}
            onChange={view.setInstant}
          />
          <p role="status" className="min-h-5 text-small text-ink-soft">
            {describeDrawing(study, shown, askedAt, formats)}
          </p>
        </>
      )}
      {live.status === 'unavailable' ? (
        <p className="measure say text-small">
          This browser could not start the drawing engine. The shadows come from the server instead:
          they follow when the handle rests.
        </p>
      ) : null}
      {shown.error === null ? null : <ProblemNotice error={shown.error} onRetry={shown.onRetry} />}
      <MapKey />
      <p className="text-small">
        All of it stands in{' '}
        <a href={`#${tableId}`} className="link">
          the table that says the same
        </a>
        .
      </p>
    </section>
  );
}

/** What the proposal shades anew, once the handle rests and its shadows are drawn. */
function describeDrawing(
  study: StudyDetail,
  { shadows, netNewM2, error }: ShownShadows,
  askedAt: string | null,
  formats: ReturnType<typeof useFormats>,
): string {
  if (error !== null) return '';
  if (shadows === null || askedAt === null || Date.parse(shadows.at) !== Date.parse(askedAt)) {
    return 'Drawing …';
  }
  const listed = study.instants.find((one) => Date.parse(one.at) === Date.parse(shadows.at));
  const areaM2 = listed?.netNewM2 ?? netNewM2;
  if (areaM2 === null) return '';
  return `At ${formats.clockWithZone(shadows.at)} the proposal shades ${formats.area(areaM2)} of ground anew.`;
}
