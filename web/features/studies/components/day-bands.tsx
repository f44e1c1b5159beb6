import { useId } from 'react';
import { bandPaths, type BandSample } from '../../../map/ledger-bands.ts';
import { SunHatch } from '../../../map/sun-hatch.tsx';

export interface DayBandsProps {
  samples: readonly BandSample[];
  /** The instants at the left and the right end. */
  fromMs: number;
  toMs: number;
}

const width = 150;
const height = 30;

/** A receptor's day as two small bands, sun before over sun after; the figures beside it say the same. */
export function DayBands({ samples, fromMs, toMs }: DayBandsProps) {
  const hatchId = useId();
  const xOf = (atMs: number) => ((atMs - fromMs) / (toMs - fromMs)) * width;
  const paths = bandPaths(samples, { xOf, beforeBottom: 14, afterBottom: 29, height: 13 });
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      preserveAspectRatio="none"
      className="block h-[30px] w-20 sm:w-[150px]"
      aria-hidden="true"
    >
      <defs>
        <SunHatch id={hatchId} spacing={4} />
      </defs>
      <path d={`M0 14.5H${width}M0 29.5H${width}`} stroke="var(--color-hairline)" />
      <path d={paths.before} fill="var(--color-marigold-fill)" />
      <path d={paths.after} fill="var(--color-marigold-fill)" />
      <path
        d={paths.lost}
        fill={`url(#${hatchId})`}
        stroke="var(--color-madder)"
        strokeWidth={0.5}
      />
    </svg>
  );
}
