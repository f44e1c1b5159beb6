import { useFormats } from '../../../lib/place-context.ts';
import type { DayOfClause } from '../counted-days.ts';

export interface DayStripProps {
  day: DayOfClause;
  minimumAltitudeDeg: number;
}

const width = 720;
const height = 120;
const foot = 12;

/** One day from midnight to midnight: the sun's altitude, the daylight, and the instants that count. */
export function DayStrip({ day, minimumAltitudeDeg }: DayStripProps) {
  const formats = useFormats();
  const { startMs, endMs, daylight, counted, instants, curve } = day;
  const x = (atMs: number) => ((atMs - startMs) / (endMs - startMs)) * width;
  const highest = Math.max(10, ...curve.map(({ altitudeDeg }) => altitudeDeg));
  const y = (altitudeDeg: number) => height - (Math.max(0, altitudeDeg) / highest) * (height - 14);
  const line = curve.map(
    ({ atMs, altitudeDeg }) => `${x(atMs).toFixed(1)},${y(altitudeDeg).toFixed(1)}`,
  );
  const hours = [0, 6, 12, 18, 24];
  return (
    <figure className="keep-together grid gap-1">
      <svg
        viewBox={`0 0 ${width} ${height + foot}`}
        className="w-full border-x border-hairline"
        preserveAspectRatio="none"
        style={{ height: '8.25rem' }}
        aria-hidden="true"
      >
        {daylight.map((span) => (
          <rect
            key={span.startMs}
            x={x(span.startMs)}
            y={0}
            width={x(span.endMs) - x(span.startMs)}
            height={height}
            className="fill-marigold-wash"
          />
        ))}
        {counted.map((span) => (
          <rect
            key={span.startMs}
            x={x(span.startMs)}
            y={0}
            width={Math.max(1.5, x(span.endMs) - x(span.startMs))}
            height={height}
            className="fill-marigold-fill stroke-ink"
            vectorEffect="non-scaling-stroke"
          />
        ))}
        <polyline
          points={line.join(' ')}
          fill="none"
          strokeWidth={2}
          className="stroke-marigold"
          vectorEffect="non-scaling-stroke"
        />
        {minimumAltitudeDeg > 0 ? (
          <line
            x1={0}
            x2={width}
            y1={y(minimumAltitudeDeg)}
            y2={y(minimumAltitudeDeg)}
            strokeDasharray="5 4"
            className="stroke-ink"
            vectorEffect="non-scaling-stroke"
          />
        ) : null}
        <line x1={0} x2={width} y1={height} y2={height} className="stroke-ink" />
        {instants.map((atMs) => (
          <line
            key={atMs}
            x1={x(atMs)}
            x2={x(atMs)}
            y1={height}
            y2={height + foot - 2}
            className="stroke-ink"
            vectorEffect="non-scaling-stroke"
          />
        ))}
      </svg>
      <div className="flex justify-between text-label text-ink-soft" aria-hidden="true">
        {hours.map((hour) => (
          <span key={hour}>{formats.civil.hour(hour)}</span>
        ))}
      </div>
    </figure>
  );
}
