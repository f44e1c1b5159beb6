import { useId, useRef, type PointerEvent } from 'react';
import { formatInstant } from '../../shared/solar/civil-time.ts';
import { useFormats } from '../lib/place-context.ts';
import { bandPaths, type BandSample } from './ledger-bands.ts';
import type { JudgedWindow } from './study-view.ts';
import {
  arcPath,
  instantOfX,
  layOutArc,
  listAltitudeLines,
  listHourTicks,
  xOfInstant,
  yOfAltitude,
  type ArcFrame,
} from './sun-arc-geometry.ts';
import { moveByKey, snapToStep, type ArcSteps } from './sun-arc-steps.ts';
import type { SunDay } from './sun-day.ts';
import { SunHatch } from './sun-hatch.tsx';
import { useWidth } from './use-width.ts';

export interface SunArcProps {
  day: SunDay;
  steps: ArcSteps;
  atMs: number;
  altitudeDeg: number;
  onChange: (atMs: number) => void;
  windows: readonly JudgedWindow[];
  /** The chosen receptor's sunlit shares of this day; null where none is chosen or none are known. */
  samples: readonly BandSample[] | null;
}

const top = 26;
const baseline = 128;
const bands = { beforeBottom: 192, afterBottom: 220, height: 22 };
const bottomWithBands = 226;
const bottomWithoutBands = 164;
/** Narrower arcs have no room for words beside the times. */
const roomForWordsPx = 480;

/**
 * The time control under the map: the day's altitude curve with the judged hours shaded. The handle
 * rides on the curve; under it lie the chosen receptor's two bands, sun before and sun after.
 */
export function SunArc({ day, steps, atMs, altitudeDeg, onChange, windows, samples }: SunArcProps) {
  const [figure, width] = useWidth<HTMLDivElement>();
  return (
    <div ref={figure} className="select-none">
      {width === null ? (
        <div style={{ height: bottomWithBands }} />
      ) : (
        <ArcDrawing {...{ day, steps, atMs, altitudeDeg, onChange, windows, samples, width }} />
      )}
    </div>
  );
}

function ArcDrawing({
  day,
  steps,
  atMs,
  altitudeDeg,
  onChange,
  windows,
  samples,
  width,
}: SunArcProps & { width: number }) {
  const formats = useFormats();
  const hatchId = useId();
  const drawing = useRef<SVGSVGElement>(null);
  const frame = layOutArc(day, { left: 50, right: width - 12, top, baseline });
  const height = samples === null ? bottomWithoutBands : bottomWithBands;
  const hasRoom = width >= roomForWordsPx;
  const atText = (ms: number) => formatInstant(ms, day.timeZone);
  const x = xOfInstant(frame, atMs);
  const y = yOfAltitude(frame, Math.max(0, altitudeDeg));

  const followPointer = (event: PointerEvent<SVGSVGElement>) => {
    const left = drawing.current?.getBoundingClientRect().left ?? 0;
    onChange(snapToStep(steps, instantOfX(frame, event.clientX - left)));
  };
  return (
    <svg
      ref={drawing}
      width={width}
      height={height}
      className="block cursor-ew-resize touch-pan-y fill-ink text-[0.75rem]"
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        followPointer(event);
      }}
      onPointerMove={(event) => {
        if (event.currentTarget.hasPointerCapture(event.pointerId)) followPointer(event);
      }}
    >
      <defs>
        <SunHatch id={hatchId} />
      </defs>
      <g aria-hidden="true">
        <JudgedHours frame={frame} windows={windows} />
        <Axis frame={frame} day={day} />
        <path
          d={arcPath(frame, day)}
          fill="none"
          stroke="var(--color-marigold)"
          strokeWidth={1.8}
        />
        <DayMarks frame={frame} day={day} hasRoom={hasRoom} />
        {samples === null ? null : (
          <Bands frame={frame} samples={samples} hatch={`url(#${hatchId})`} />
        )}
        <line x1={x} x2={x} y1={top - 10} y2={height - 4} stroke="var(--color-ink)" />
        <HandleLabel
          x={x}
          width={width}
          text={`${formats.clock(atText(atMs))} · ${formats.angle(altitudeDeg)} high`}
        />
      </g>
      <g
        role="slider"
        tabIndex={0}
        aria-label="Time of day"
        aria-orientation="horizontal"
        aria-valuemin={toMinutes(steps.firstMs - day.startMs)}
        aria-valuemax={toMinutes(steps.lastMs - day.startMs)}
        aria-valuenow={toMinutes(atMs - day.startMs)}
        aria-valuetext={`${formats.clockWithZone(atText(atMs))}, sun ${formats.angle(altitudeDeg)} high`}
        className="group outline-none"
        onKeyDown={(event) => {
          const nextMs = moveByKey(steps, atMs, event.key);
          if (nextMs === null) return;
          event.preventDefault();
          onChange(nextMs);
        }}
      >
        <circle cx={x} cy={y} r={16} fill="transparent" />
        <circle
          cx={x}
          cy={y}
          r={14}
          fill="none"
          stroke="var(--color-ink)"
          strokeWidth={2}
          className="opacity-0 group-focus-visible:opacity-100"
        />
        <circle
          cx={x}
          cy={y}
          r={9}
          fill="var(--color-marigold-fill)"
          stroke="var(--color-ink)"
          strokeWidth={1.5}
        />
      </g>
    </svg>
  );
}

function JudgedHours({ frame, windows }: { frame: ArcFrame; windows: readonly JudgedWindow[] }) {
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
          y={top - 6}
          width={Math.max(1, right - left)}
          height={baseline - top + 6}
          fill="var(--color-marigold-fill)"
          fillOpacity={0.38}
        />
        <text x={left + 6} y={baseline - 6}>
          {right - left > 190 ? long : right - left > 50 ? 'judged' : ''}
        </text>
      </g>
    );
  });
}

function Axis({ frame, day }: { frame: ArcFrame; day: SunDay }) {
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
      <line x1={frame.left} x2={frame.right} y1={baseline} y2={baseline} />
      {ticks.map((tick) => {
        const x = xOfInstant(frame, tick.atMs);
        return (
          <g key={tick.atMs}>
            <line x1={x} x2={x} y1={baseline} y2={baseline + (tick.isMain ? 6 : 4)} />
            {isRoomy || tick.isMain ? (
              <text x={x} y={baseline + 18} textAnchor="middle" stroke="none">
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
function DayMarks({ frame, day, hasRoom }: { frame: ArcFrame; day: SunDay; hasRoom: boolean }) {
  const formats = useFormats();
  const clock = (ms: number) => formats.clock(new Date(ms).toISOString());
  const y = baseline + 34;
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

function Bands({ frame, samples, hatch }: BandsProps) {
  const xOf = (atMs: number) => xOfInstant(frame, atMs);
  const paths = bandPaths(samples, { ...bands, xOf });
  // The whole height stands for the whole open area in sun.
  const fromX = xOf(samples.at(0)?.atMs ?? frame.fromMs);
  const toX = xOf(samples.at(-1)?.atMs ?? frame.toMs);
  return (
    <g>
      {[
        { label: 'before', bottom: bands.beforeBottom },
        { label: 'after', bottom: bands.afterBottom },
      ].map(({ label, bottom }) => (
        <g key={label}>
          <text x={0} y={bottom - 4}>
            {label}
          </text>
          <rect
            x={fromX}
            y={bottom - bands.height}
            width={toX - fromX}
            height={bands.height}
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
function HandleLabel({ x, width, text }: HandleLabelProps) {
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

function toMinutes(ms: number): number {
  return Math.round(ms / 60_000);
}
