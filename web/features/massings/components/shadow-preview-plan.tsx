import { useId, useMemo } from 'react';
import { createFrame } from '../../../../shared/drawing/frame.ts';
import type { PlaneExtent } from '../../../../shared/drawing/frame.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { createLocalPlane } from '../../../../shared/geometry/local-plane.ts';
import { projectPolygon } from '../../../../shared/geometry/project-polygon.ts';
import type { SunPosition } from '../../../../shared/solar/sun-position.ts';
import { usePlace } from '../../../lib/place-context.ts';
import { NorthAndScale } from '../../../map/north-and-scale.tsx';
import { useWidth } from '../../../map/use-width.ts';
import { contoursPath, shadowContours, type PreviewBlock } from '../shadow-preview.ts';

export interface ShadowPreviewPlanProps {
  blocks: readonly PreviewBlock[];
  site: Polygonal | null;
  sun: SunPosition;
  /** What of the ground is shown; it stays while the sun moves. */
  extent: PlaneExtent;
  label: string;
}

const firstWidthPx = 720;
const tallestRem = 36;

/** The shadows of the blocks on level ground, from raw contours filled by the NonZero rule. */
export function ShadowPreviewPlan({ blocks, site, sun, extent, label }: ShadowPreviewPlanProps) {
  const { longitude, latitude } = usePlace().municipality;
  const hatchId = useId();
  const maskId = useId();
  const plane = useMemo(() => createLocalPlane(longitude, latitude), [longitude, latitude]);
  const [holder, widthPx] = useWidth<HTMLDivElement>();
  const frame = useMemo(
    () => createFrame(plane, extent, widthPx ?? firstWidthPx),
    [plane, extent, widthPx],
  );
  const siteRings = site === null ? [] : projectPolygon(site, plane);
  const footprints = (role: PreviewBlock['role']) =>
    contoursPath(
      blocks.filter((one) => one.role === role).flatMap(({ block }) => block.rings),
      frame.toSheet,
    );
  const standing = contoursPath(shadowContours(blocks, 'existing', sun), frame.toSheet);
  const coming = contoursPath(shadowContours(blocks, 'proposed', sun), frame.toSheet);

  return (
    <div
      ref={holder}
      className="border border-hairline bg-sheet"
      style={{ maxWidth: `${((tallestRem * frame.width) / frame.height).toFixed(1)}rem` }}
    >
      <svg
        viewBox={`0 0 ${frame.width} ${frame.height.toFixed(1)}`}
        role="img"
        aria-label={label}
        className="block h-auto w-full"
      >
        <defs>
          <pattern
            id={hatchId}
            width="7"
            height="7"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(45)"
          >
            <path d="M0 0V7" stroke="var(--color-madder)" strokeWidth="2.4" />
          </pattern>
          <mask id={maskId} maskUnits="userSpaceOnUse">
            <rect width={frame.width} height={frame.height} fill="white" />
            <path d={standing} fill="black" fillRule="nonzero" />
          </mask>
        </defs>
        <path d={standing} fillRule="nonzero" fill="var(--color-slate)" fillOpacity="0.35" />
        <g mask={`url(#${maskId})`}>
          <path d={coming} fillRule="nonzero" fill="var(--color-madder)" fillOpacity="0.1" />
          <path d={coming} fillRule="nonzero" fill={`url(#${hatchId})`} />
        </g>
        <path
          d={contoursPath(siteRings, frame.toSheet)}
          fill="none"
          stroke="var(--color-ink)"
          strokeWidth="1.5"
          strokeDasharray="10 3 2 3"
        />
        <path
          d={footprints('existing')}
          fill="none"
          stroke="var(--color-ink)"
          strokeWidth="0.8"
          strokeDasharray="2 2"
        />
        <path
          d={footprints('proposed')}
          fill="var(--color-sheet)"
          stroke="var(--color-ink)"
          strokeWidth="2"
        />
        <g transform={`translate(10 ${(frame.height - 72).toFixed(1)})`}>
          <NorthAndScale metresToPixel={1 / frame.pxPerM} />
        </g>
      </svg>
    </div>
  );
}
