import { useMemo, useState } from 'react';
import { formatInstant } from '../../../shared/solar/civil-time.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';
import { NoonMark } from '../../components/noon-mark.tsx';
import { DayBands } from '../../features/studies/components/day-bands.tsx';
import { MapKey } from '../../features/studies/components/map-key.tsx';
import { usePlace } from '../../lib/place-context.ts';
import type { BandSample } from '../../map/ledger-bands.ts';
import { MapTitleBlock } from '../../map/map-title-block.tsx';
import { NorthAndScale } from '../../map/north-and-scale.tsx';
import { PlayDay } from '../../map/play-day.tsx';
import { listArcSteps } from '../../map/sun-arc-steps.ts';
import { SunArc } from '../../map/sun-arc.tsx';
import { computeSunDay, type SunDay } from '../../map/sun-day.ts';
import { DesignSection, Specimen } from './design-section.tsx';

const date = '2026-12-21';
const hourMs = 3_600_000;

/** A yard that loses the sun of the hours around noon. */
function drawSamples(day: SunDay): BandSample[] {
  return day.curve.map(({ atMs, altitudeDeg }) => {
    const shareBefore = Math.min(1, altitudeDeg / 12);
    const isLost = Math.abs(atMs - day.noonMs) < 1.5 * hourMs;
    return { atMs, shareBefore, shareAfter: isLost ? 0.1 : shareBefore };
  });
}

export function DrawingSection() {
  const { municipality } = usePlace();
  const { timeZone, longitude, latitude } = municipality;
  const day = useMemo(
    () => computeSunDay(date, timeZone, longitude, latitude),
    [timeZone, longitude, latitude],
  );
  const samples = useMemo(() => drawSamples(day), [day]);
  const windows = [
    { title: 'Noon hours', fromMs: day.noonMs - 2 * hourMs, toMs: day.noonMs + 2 * hourMs },
  ];
  const steps = listArcSteps(day, windows[0] ?? null);
  const [atMs, setAtMs] = useState(day.noonMs);
  const sun = sunPositionAt(atMs, longitude, latitude);
  if (steps === null) return null;
  const arc = { day, steps, atMs, altitudeDeg: sun.altitudeDeg, onChange: setAtMs };
  return (
    <DesignSection title="Drawing">
      <div className="grid gap-8 lg:grid-cols-2">
        <Specimen name="the sun arc with the judged hours and a receptor’s bands">
          <SunArc {...arc} windows={windows} samples={samples} />
          <PlayDay steps={steps} atMs={atMs} isDrawn onChange={setAtMs} />
        </Specimen>
        <Specimen name="the sun arc on a day that is not judged">
          <SunArc {...arc} windows={[]} samples={null} />
        </Specimen>
        <Specimen name="a map’s title block">
          <MapTitleBlock
            block={{
              caseReference: '2026-0001',
              revision: 2,
              studyDigest: `sha256:${'a1b2c3d4'.repeat(8)}`,
              at: formatInstant(atMs, timeZone),
              ...sun,
            }}
          />
        </Specimen>
        <Specimen name="a title block while nothing is drawn">
          <MapTitleBlock
            block={{
              caseReference: '2026-0001',
              revision: 2,
              studyDigest: null,
              at: null,
              azimuthDeg: null,
              altitudeDeg: null,
            }}
          />
        </Specimen>
        <Specimen name="true north and scale">
          <NorthAndScale metresToPixel={0.4} />
        </Specimen>
        <Specimen name="the key of a study’s map">
          <MapKey />
        </Specimen>
        <Specimen name="a day in small: before over after">
          <DayBands
            samples={samples}
            fromMs={day.curve.at(0)?.atMs ?? day.startMs}
            toMs={day.curve.at(-1)?.atMs ?? day.endMs}
          />
        </Specimen>
        <Specimen name="the mark, at 20°, 45° and 67° of noon sun">
          <div className="flex gap-6">
            {[20, 45, 67].map((noonAltitudeDeg) => (
              <NoonMark key={noonAltitudeDeg} noonAltitudeDeg={noonAltitudeDeg} />
            ))}
          </div>
        </Specimen>
      </div>
    </DesignSection>
  );
}
