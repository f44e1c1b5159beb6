import { useMemo } from 'react';
import type { FindingRow, InstantShadows } from '../../../../shared/contracts/studies.ts';
import { drawPlan, emptyPlan } from '../../../../shared/drawing/plan-drawing.ts';
import { titleBlockRows, type TitleBlock } from '../../../../shared/drawing/title-block.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { SvgDrawing } from '../../../components/svg-drawing.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import type { ShadowLayer } from '../../../map/case-layers.ts';
import type { Bounds } from '../../../map/map-features.ts';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { mapBlocksOf, mapReceptorsOf } from '../map-contents.ts';

export interface StudyPlanProps {
  site: Polygonal | null;
  evidence: DrawnEvidence;
  rows: readonly FindingRow[];
  shadows: InstantShadows | null;
  layer: ShadowLayer;
  chosen: string | null;
  bounds: Bounds;
  titleBlock: TitleBlock;
}

const width = 760;
const nothing: Polygonal = { type: 'MultiPolygon', coordinates: [] };

/** What the study's map shows as a drawing, for browsers that cannot draw the map. */
export function StudyPlan({
  site,
  evidence,
  rows,
  shadows,
  layer,
  chosen,
  bounds,
  titleBlock,
}: StudyPlanProps) {
  const { municipality, formats } = usePlace();
  const { longitude, latitude } = municipality;
  const markup = useMemo(() => {
    const receptors = mapReceptorsOf(evidence, rows);
    const isBefore = layer === 'before';
    const footprints = (role: string) =>
      evidence.blocks.features
        .filter(({ properties }) => properties.role === role)
        .map(({ geometry }) => geometry);
    const shadowOf = (kind: string): Polygonal =>
      shadows?.features.find(({ properties }) => properties.kind === kind)?.geometry ?? nothing;
    return drawPlan(
      {
        ...emptyPlan,
        parcels: receptors.filter((one) => one.class === 'parcel').map((one) => one.geometry),
        buildings: isBefore
          ? [...footprints('context'), ...footprints('existing')]
          : footprints('context'),
        site: site === null ? [] : [site],
        removed: isBefore ? [] : footprints('existing'),
        proposal: isBefore ? [] : mapBlocksOf(evidence).filter(({ role }) => role === 'proposed'),
        shadows: {
          standing: layer === 'net-new' ? nothing : shadowOf('before'),
          netNew: isBefore ? nothing : shadowOf('netNew'),
        },
        chosen: receptors.find(({ id }) => id === chosen)?.geometry ?? null,
        notMet: receptors
          .filter(({ finding }) => finding === 'not-met')
          .map(({ geometry }) => ({ geometry, mark: '✕' })),
      },
      {
        origin: { longitude, latitude },
        extent: bounds,
        width,
        label: 'Plan of the study: the site, the shadows of the chosen time, and the receptors',
        figures: formats.figure,
        detail: 'sheet',
        titleBlock: titleBlockRows(titleBlock, formats.civil, formats.figure),
      },
    );
  }, [
    site,
    evidence,
    rows,
    shadows,
    layer,
    chosen,
    bounds,
    titleBlock,
    longitude,
    latitude,
    formats,
  ]);
  return <SvgDrawing markup={markup} />;
}
