import { roundScaleLength } from '../../shared/drawing/north-and-scale.ts';
import { useFormats } from '../lib/place-context.ts';

export interface NorthAndScaleProps {
  /** Metres of ground to one CSS pixel. */
  metresToPixel: number;
  /** What is up on the screen, degrees clockwise from true north. */
  bearingDeg?: number;
  /** A tilted view has no one scale. */
  hasScale?: boolean;
}

const barWidthPx = 110;

/** True north and a scale bar, as on every plan. */
export function NorthAndScale({
  metresToPixel,
  bearingDeg = 0,
  hasScale = true,
}: NorthAndScaleProps) {
  const { number } = useFormats();
  const lengthM = roundScaleLength(metresToPixel * barWidthPx);
  const lengthPx = lengthM / metresToPixel;
  const label = lengthM >= 1000 ? `${number(lengthM / 1000)} km` : `${number(lengthM)} m`;
  const northText =
    bearingDeg === 0
      ? 'True north is up'
      : `True north is ${number(bearingDeg > 180 ? 360 - bearingDeg : bearingDeg)}° to the ${bearingDeg > 180 ? 'right' : 'left'} of up`;
  const turn = `rotate(${-bearingDeg} 14 38)`;
  return (
    <svg
      width={hasScale ? 38 + lengthPx + 10 : 34}
      height={64}
      role="img"
      aria-label={
        hasScale
          ? `${northText}; the scale bar is ${label} long.`
          : `${northText}; a tilted view has no one scale.`
      }
      className="block"
    >
      <g
        stroke="var(--color-sheet)"
        strokeWidth={4}
        strokeLinejoin="round"
        fill="none"
        opacity={0.9}
      >
        <NorthArrow turn={turn} />
        {hasScale ? <ScaleBar lengthPx={lengthPx} /> : null}
      </g>
      <g stroke="var(--color-ink)" strokeWidth={1.2} fill="none">
        <NorthArrow turn={turn} />
        {hasScale ? <ScaleBar lengthPx={lengthPx} /> : null}
      </g>
      <g
        fill="var(--color-ink)"
        stroke="var(--color-sheet)"
        strokeWidth={3}
        paintOrder="stroke"
        fontSize={11}
      >
        <text x={14} y={12} textAnchor="middle" transform={turn}>
          N
        </text>
        {hasScale ? (
          <>
            <text x={38} y={45}>
              0
            </text>
            <text x={38 + lengthPx} y={45} textAnchor="end">
              {label}
            </text>
          </>
        ) : null}
      </g>
    </svg>
  );
}

function NorthArrow({ turn }: { turn: string }) {
  return <path d="M14 60V17M10 24L14 17L18 24M7 44H21" transform={turn} />;
}

function ScaleBar({ lengthPx }: { lengthPx: number }) {
  return <path d={`M38 56h${lengthPx}M38 51v9M${38 + lengthPx / 2} 53v6M${38 + lengthPx} 51v9`} />;
}
