import { roundScaleLength } from '../../shared/drawing/north-and-scale.ts';
import { useFormats } from '../lib/place-context.ts';

export interface NorthAndScaleProps {
  /** Metres of ground to one CSS pixel. */
  metresToPixel: number;
}

const barWidthPx = 110;

/** True north and a scale bar, as on every plan. North is up: the map does not turn. */
export function NorthAndScale({ metresToPixel }: NorthAndScaleProps) {
  const { number } = useFormats();
  const lengthM = roundScaleLength(metresToPixel * barWidthPx);
  const lengthPx = lengthM / metresToPixel;
  const label = lengthM >= 1000 ? `${number(lengthM / 1000)} km` : `${number(lengthM)} m`;
  return (
    <svg
      width={38 + lengthPx + 10}
      height={64}
      role="img"
      aria-label={`True north is up; the scale bar is ${label} long.`}
      className="block"
    >
      <g
        stroke="var(--color-sheet)"
        strokeWidth={4}
        strokeLinejoin="round"
        fill="none"
        opacity={0.9}
      >
        <NorthArrow />
        <ScaleBar lengthPx={lengthPx} />
      </g>
      <g stroke="var(--color-ink)" strokeWidth={1.2} fill="none">
        <NorthArrow />
        <ScaleBar lengthPx={lengthPx} />
      </g>
      <g
        fill="var(--color-ink)"
        stroke="var(--color-sheet)"
        strokeWidth={3}
        paintOrder="stroke"
        fontSize={11}
      >
        <text x={14} y={12} textAnchor="middle">
          N
        </text>
        <text x={38} y={45}>
          0
        </text>
        <text x={38 + lengthPx} y={45} textAnchor="end">
          {label}
        </text>
      </g>
    </svg>
  );
}

function NorthArrow() {
  return <path d="M14 60V17M10 24L14 17L18 24M7 44H21" />;
}

function ScaleBar({ lengthPx }: { lengthPx: number }) {
  return <path d={`M38 56h${lengthPx}M38 51v9M${38 + lengthPx / 2} 53v6M${38 + lengthPx} 51v9`} />;
}
