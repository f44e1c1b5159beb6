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
const height = 24;

/** A receptor's day as two small bands, sun before over sun after; the figures beside it say the same. */
export function DayBands({ samples, fromMs, toMs }: DayBandsProps) {
  const hatchId = useId();
  const xOf = (atMs: number) => ((atMs - fromMs) / (toMs - fromMs)) * width;
  const paths = bandPaths(samples, { xOf, beforeBottom: 11, afterBottom: 23, height: 9 });
  return (
    <svg width={width} height={height} className="block" aria-hidden="true">
      <defs>
        <SunHatch id={hatchId} spacing={4} />
      </defs>
      <path d={`M0 11.5H${width}M0 23.5H${width}`} stroke="var(--color-hairline)" />
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
