import { useMemo, useState } from 'react';
import type { PlaneExtent } from '../../../../shared/drawing/frame.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../../../shared/geometry/local-plane.ts';
import { projectPolygon } from '../../../../shared/geometry/project-polygon.ts';
import { boxOfRings, joinBoxes } from '../../../../shared/geometry/ring.ts';
import { castBlockContours } from '../../../../shared/shadow/shadow-contours.ts';
import { civilDateOf, formatInstant } from '../../../../shared/solar/civil-time.ts';
import { sunPositionAt } from '../../../../shared/solar/sun-position.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import { listArcSteps, snapToStep } from '../../../map/sun-arc-steps.ts';
import { SunArc } from '../../../map/sun-arc.tsx';
import { computeSunDay, type SunDay } from '../../../map/sun-day.ts';
import type { DrawnBlock } from '../drawn-block.ts';
import { nextKeyDates, planeBlocksOf, type PreviewBlock } from '../shadow-preview.ts';
import { ShadowPreviewPlan } from './shadow-preview-plan.tsx';

export interface ShadowPreviewProps {
  blocks: readonly DrawnBlock[];
  site: Polygonal | null;
}

/** Shadows are followed out to where a sun of this height casts them; in winter, of this share of noon's. */
const sheetAltitudeDeg = 15;
const sheetShareOfNoon = 0.6;
const sheetMarginM = 25;

/** A first look at the shadows on the next key dates, computed here; the study follows after submission. */
export function ShadowPreview({ blocks, site }: ShadowPreviewProps) {
  const { municipality, formats } = usePlace();
  const { longitude, latitude, timeZone } = municipality;
  const [keyDates] = useState(() => nextKeyDates(civilDateOf(Date.now(), timeZone), timeZone));
  const [date, setDate] = useState(keyDates[0]?.date ?? null);
  const planeBlocks = useMemo(
    () => planeBlocksOf(blocks, { longitude, latitude }),
    [blocks, longitude, latitude],
  );
  const day = useMemo(
    () => (date === null ? null : computeSunDay(date, timeZone, longitude, latitude)),
    [date, timeZone, longitude, latitude],
  );
  const extent = useMemo(
    () => (day === null ? null : reachOf(planeBlocks, site, day, { longitude, latitude })),
    [planeBlocks, site, day, longitude, latitude],
  );
  const steps = useMemo(() => (day === null ? null : listArcSteps(day, null)), [day]);
  const [chosenMs, setChosenMs] = useState<number | null>(null);
  if (day === null || extent === null) return null;
  if (steps === null) return <p>The sun does not rise on {formats.date(day.date)}.</p>;

  const isOnDay = chosenMs !== null && chosenMs >= day.startMs && chosenMs < day.endMs;
  const atMs = snapToStep(steps, isOnDay ? chosenMs : day.noonMs);
  const sun = sunPositionAt(atMs, longitude, latitude);
  const at = formatInstant(atMs, timeZone);
  return (
    <div className="grid gap-3">
      <ChoiceRow
        label="Key date"
        options={keyDates.map((one) => ({ id: one.date, label: formats.dayOfYear(one.date) }))}
        value={date}
        onChange={setDate}
      />
      <p role="status" className="text-small">
        {formats.instant(at)} · sun {formats.angle(sun.azimuthDeg)} from north,{' '}
        {formats.angle(sun.altitudeDeg)} high
      </p>
      {sun.altitudeDeg > 0 ? (
        <ShadowPreviewPlan
          blocks={planeBlocks}
          site={site}
          sun={sun}
          extent={extent}
          label={`Shadows of the blocks on level ground, ${formats.instant(at)}.`}
        />
      ) : null}
      <SunArc
        day={day}
        steps={steps}
        atMs={atMs}
        altitudeDeg={sun.altitudeDeg}
        onChange={setChosenMs}
        windows={[]}
        samples={null}
      />
      <p className="flex flex-wrap gap-x-5 gap-y-1 text-small">
        <span className="flex items-center gap-1.5">
          <span
            aria-hidden="true"
            className="inline-block h-3 w-4 border border-slate bg-slate/35"
          />
          shadow of what stands on the site today
        </span>
        <span className="flex items-center gap-1.5">
          <span aria-hidden="true" className="hatched inline-block h-3 w-4 border border-madder" />
          added by the proposed blocks
        </span>
      </p>
      <p className="measure text-small text-ink-soft">
        A preview on level ground with your blocks alone. The neighbours’ own shadows, and what the
        rule says, come with the study.
      </p>
    </div>
  );
}

/** The site and the ground that a day's shadows reach, but for those of a low sun. */
function reachOf(
  blocks: readonly PreviewBlock[],
  site: Polygonal | null,
  day: SunDay,
  place: { longitude: number; latitude: number },
): PlaneExtent | null {
  const lowestDeg = Math.min(sheetAltitudeDeg, day.noonAltitudeDeg * sheetShareOfNoon);
  const suns = day.curve
    .map(({ atMs }) => sunPositionAt(atMs, place.longitude, place.latitude))
    .filter(({ altitudeDeg }) => altitudeDeg > 0 && altitudeDeg >= lowestDeg);
  const boxes = blocks.flatMap(({ block }) => [
    block.box,
    ...suns.map((sun) => boxOfRings(castBlockContours(block, sun, 0))),
  ]);
  if (site !== null) {
    const plane = createLocalPlane(place.longitude, place.latitude);
    boxes.push(boxOfRings(projectPolygon(site, plane)));
  }
  const [first, ...rest] = boxes;
  if (first === undefined) return null;
  const box = rest.reduce(joinBoxes, first);
  return {
    westM: box.minX - sheetMarginM,
    southM: box.minY - sheetMarginM,
    eastM: box.maxX + sheetMarginM,
    northM: box.maxY + sheetMarginM,
  };
}
