import { useFormats } from '../lib/place-context.ts';
import { bandPaths, type BandSample } from './ledger-bands.ts';
import type { JudgedWindow } from './study-view.ts';
import {
  listAltitudeLines,
  listHourTicks,
  xOfInstant,
  yOfAltitude,
  type ArcFrame,
} from './sun-arc-geometry.ts';
import type { SunDay } from './sun-day.ts';

/** Where the arc's curve begins and ends, in pixels from the drawing's top. */
export const arcHeights = { top: 26, baseline: 128 } as const;

const bandHeights = { beforeBottom: 192, afterBottom: 220, height: 22 } as const;

export function JudgedHours({
  frame,
  windows,
}: {
  frame: ArcFrame;
  windows: readonly JudgedWindow[];
}) {
  const formats = useFormats();
  return windows.map((window) => {
    const left = xOfInstant(frame, window.fromMs);
    const right = xOfInstant(frame, window.toMs);
    const clock = (ms: number) => formats.clock(new Date(ms).toISOString());
    const long = `judged ${clock(window.fromMs)} – ${clock(window.toMs)}`;
    return (
      <g key={`${window.fromMs} ${window.toMs}`}>
        <rect
          x={left}
          y={arcHeights.top - 6}
          width={Math.max(1, right - left)}
          height={arcHeights.baseline - arcHeights.top + 6}
          fill="var(--color-marigold-fill)"
          fillOpacity={0.38}
        />
        <text x={left + 6} y={arcHeights.baseline - 6}>
          {right - left > 190 ? long : right - left > 50 ? 'judged' : ''}
        </text>
      </g>
    );
  });
}

export function Axis({ frame, day }: { frame: ArcFrame; day: SunDay }) {
  const formats = useFormats();
  const ticks = listHourTicks(frame, day.timeZone, formats.locale);
  const isRoomy = (frame.right - frame.left) / Math.max(1, ticks.length) > 22;
  return (
    <g stroke="var(--color-ink)">
      {listAltitudeLines(frame).map((altitudeDeg) => {
        const y = yOfAltitude(frame, altitudeDeg);
        return (
          <g key={altitudeDeg}>
            <line x1={frame.left} x2={frame.right} y1={y} y2={y} strokeOpacity={0.14} />
            <text x={frame.left - 6} y={y + 4} textAnchor="end" stroke="none">
              {altitudeDeg}°
            </text>
          </g>
        );
      })}
      <line x1={frame.left} x2={frame.right} y1={arcHeights.baseline} y2={arcHeights.baseline} />
      {ticks.map((tick) => {
        const x = xOfInstant(frame, tick.atMs);
        return (
          <g key={tick.atMs}>
            <line
              x1={x}
              x2={x}
              y1={arcHeights.baseline}
              y2={arcHeights.baseline + (tick.isMain ? 6 : 4)}
            />
            {isRoomy || tick.isMain ? (
              <text x={x} y={arcHeights.baseline + 18} textAnchor="middle" stroke="none">
                {tick.label}
              </text>
            ) : null}
          </g>
        );
      })}
    </g>
  );
}

/** Sunrise, the highest sun and sunset, with their times. */
export function DayMarks({
  frame,
  day,
  hasRoom,
}: {
  frame: ArcFrame;
  day: SunDay;
  hasRoom: boolean;
}) {
  const formats = useFormats();
  const clock = (ms: number) => formats.clock(new Date(ms).toISOString());
  const y = arcHeights.baseline + 34;
  const noonX = xOfInstant(frame, day.noonMs);
  const noonY = yOfAltitude(frame, day.noonAltitudeDeg);
  return (
    <g fill="var(--color-marigold)">
      <line
        x1={noonX}
        x2={noonX}
        y1={noonY - 5}
        y2={noonY + 5}
        stroke="var(--color-marigold)"
        strokeWidth={1.8}
      />
      {day.sunriseMs === null ? null : (
        <text x={xOfInstant(frame, day.sunriseMs)} y={y}>
          {hasRoom ? 'sunrise ' : ''}
          {clock(day.sunriseMs)}
        </text>
      )}
      <text x={noonX} y={y} textAnchor="middle">
        {hasRoom ? 'noon ' : ''}
        {clock(day.noonMs)}
      </text>
      {day.sunsetMs === null ? null : (
        <text x={xOfInstant(frame, day.sunsetMs)} y={y} textAnchor="end">
          {hasRoom ? 'sunset ' : ''}
          {clock(day.sunsetMs)}
        </text>
      )}
    </g>
  );
}

interface BandsProps {
  frame: ArcFrame;
  samples: readonly BandSample[];
  hatch: string;
}

export function Bands({ frame, samples, hatch }: BandsProps) {
  const xOf = (atMs: number) => xOfInstant(frame, atMs);
  const paths = bandPaths(samples, { ...bandHeights, xOf });
  // The whole height stands for the whole open area in sun.
  const fromX = xOf(samples.at(0)?.atMs ?? frame.fromMs);
  const toX = xOf(samples.at(-1)?.atMs ?? frame.toMs);
  return (
    <g>
      {[
        { label: 'before', bottom: bandHeights.beforeBottom },
        { label: 'after', bottom: bandHeights.afterBottom },
      ].map(({ label, bottom }) => (
        <g key={label}>
          <text x={0} y={bottom - 4}>
            {label}
          </text>
          <rect
            x={fromX}
            y={bottom - bandHeights.height}
            width={toX - fromX}
            height={bandHeights.height}
            fill="var(--color-sheet)"
            stroke="var(--color-hairline)"
          />
        </g>
      ))}
      <g strokeWidth={0.8}>
        <path d={paths.before} fill="var(--color-marigold-fill)" stroke="var(--color-marigold)" />
        <path d={paths.after} fill="var(--color-marigold-fill)" stroke="var(--color-marigold)" />
        <path d={paths.lost} fill={hatch} stroke="var(--color-madder)" />
      </g>
    </g>
  );
}

interface HandleLabelProps {
  x: number;
  width: number;
  text: string;
}

/** The time beside the handle's line; on its other side where the sheet ends. */
export function HandleLabel({ x, width, text }: HandleLabelProps) {
  const isLate = x > width - 150;
  return (
    <text
      x={isLate ? x - 8 : x + 8}
      y={13}
      textAnchor={isLate ? 'end' : 'start'}
      className="text-small font-strong"
    >
      {text}
    </text>
  );
}
