import { useMemo } from 'react';
import { drawAxonometric } from '../../../../shared/drawing/axonometric-drawing.ts';
import { drawPlan, emptyPlan } from '../../../../shared/drawing/plan-drawing.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { SvgDrawing } from '../../../components/svg-drawing.tsx';
import { usePlace } from '../../../lib/place-context.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { boundsAround } from '../../../map/map-features.ts';
import type { DrawnBlock } from '../drawn-block.ts';

export interface MassingDrawingsProps {
  blocks: readonly DrawnBlock[];
  site: Polygonal | null;
}

/** Smaller than they are shown, so that the drawings' letters, made for paper, can be read on a screen. */
const planWidth = 220;
const axonometric = { width: 310, height: 250 } as const;
const marginM = 18;

const viewpoints = [
  { id: 'south-west', label: 'from the south-west', fromDeg: 225 },
  { id: 'south-east', label: 'south-east', fromDeg: 135 },
  { id: 'north-east', label: 'north-east', fromDeg: 45 },
  { id: 'north-west', label: 'north-west', fromDeg: 315 },
] as const;

/** The blocks in plan and in three dimensions, to see whether they were understood. */
export function MassingDrawings({ blocks, site }: MassingDrawingsProps) {
  const { municipality, formats } = usePlace();
  const { longitude, latitude } = municipality;
  const [viewId, setViewId] = useSearchState('from');
  const viewpoint = viewpoints.find(({ id }) => id === viewId) ?? viewpoints[0];
  const sites = useMemo(() => (site === null ? [] : [site]), [site]);

  const plan = useMemo(() => {
    const extent = boundsAround([...sites, ...blocks.map(({ geometry }) => geometry)], marginM);
    if (extent === null) return null;
    return drawPlan(
      {
        ...emptyPlan,
        site: sites,
        removed: blocks.filter(({ role }) => role === 'existing').map(({ geometry }) => geometry),
        proposal: blocks.filter(({ role }) => role === 'proposed'),
      },
      {
        origin: { longitude, latitude },
        extent,
        width: planWidth,
        label: 'The blocks in plan with the site boundary; the table of blocks says the same.',
        figures: formats.figure,
        detail: 'sheet',
        titleBlock: [],
      },
    );
  }, [blocks, sites, longitude, latitude, formats]);

  const view = useMemo(
    () =>
      drawAxonometric(
        blocks.map(({ role, ...block }) => ({
          ...block,
          role: role === 'proposed' ? 'proposed' : 'context',
        })),
        { site: sites, parcels: [] },
        {
          origin: { longitude, latitude },
          ...axonometric,
          view: { fromDeg: viewpoint.fromDeg, altitudeDeg: 35 },
          label: `The blocks seen from the ${viewpoint.id}; the table of blocks says the same.`,
          figures: formats.figure,
        },
      ),
    [blocks, sites, longitude, latitude, viewpoint, formats],
  );

  if (plan === null) return null;
  return (
    <div className="grid items-start gap-6 md:grid-cols-2">
      <figure className="grid gap-2">
        <SvgDrawing markup={plan} />
        <figcaption className="text-small text-ink-soft">
          In plan. Dashed and dotted: the site boundary. Fine dashes: stands today, removed.
        </figcaption>
      </figure>
      <figure className="grid gap-2">
        <SvgDrawing markup={view} className="border border-hairline" />
        <figcaption className="grid gap-1 text-small">
          <span className="text-ink-soft">In three dimensions, with the height of each top.</span>
          <ChoiceRow
            label="Seen from"
            options={viewpoints}
            value={viewpoint.id}
            onChange={setViewId}
          />
        </figcaption>
      </figure>
    </div>
  );
}
