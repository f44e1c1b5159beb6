import { useId, useRef, type PointerEvent } from 'react';
import { formatInstant } from '../../shared/solar/civil-time.ts';
import { useFormats } from '../lib/place-context.ts';
import type { BandSample } from './ledger-bands.ts';
import type { JudgedWindow } from './study-view.ts';
import { arcPath, instantOfX, layOutArc, xOfInstant, yOfAltitude } from './sun-arc-geometry.ts';
import { Axis, Bands, DayMarks, HandleLabel, JudgedHours, arcHeights } from './sun-arc-marks.tsx';
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
  const frame = layOutArc(day, {
    left: 50,
    right: width - 12,
    top: arcHeights.top,
    baseline: arcHeights.baseline,
  });
  const height = samples === null ? bottomWithoutBands : bottomWithBands;
  const hasRoom = width >= roomForWordsPx;
  const atText = (ms: number) => formatInstant(ms, day.timeZone);
  const x = xOfInstant(frame, atMs);
  const y = yOfAltitude(frame, Math.max(0, altitudeDeg));

  const isJudged = windows.some(({ fromMs, toMs }) => fromMs <= atMs && atMs <= toMs);

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
        <line x1={x} x2={x} y1={arcHeights.top - 10} y2={height - 4} stroke="var(--color-ink)" />
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
        aria-valuetext={`${formats.clockWithZone(atText(atMs))}, sun ${formats.angle(altitudeDeg)} high${isJudged ? ', an hour that the rule judges' : ''}`}
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

function toMinutes(ms: number): number {
  return Math.round(ms / 60_000);
}
