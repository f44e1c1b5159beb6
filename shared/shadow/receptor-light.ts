import { boxOfRings, type Box, type Ring } from '../geometry/ring.ts';
import type { BlockShadow, ShadowLayer } from './shadow-layer.ts';
import { createWindingSweep, type MeasureAreas, type SweepLayer } from './winding-sweep.ts';

/** A place to be judged: its rings on the local plane, cut where they lie inside the site. */
export interface LitArea {
  /** Counter-clockwise rings are counted in, clockwise ones out. */
  rings: readonly Ring[];
  box: Box;
}

/** How the light falls on an area at one instant, in m². */
export interface AreaLight {
  sunBeforeM2: number;
  sunAfterM2: number;
  /** In sun before, in shade after. */
  netNewM2: number;
  /** In shade before, in sun after. */
  removedM2: number;
}

const counters = { area: 0, context: 1, existing: 2, proposed: 3 } as const;
const outcomes = { sunInBoth: 0, netNew: 1, removed: 2 } as const;

/**
 * An area to be judged: a receptor's rings less the site's, since what lies on the site is not
 * judged there.
 */
export function makeLitArea(rings: readonly Ring[], siteRings: readonly Ring[]): LitArea {
  return {
    rings: [...rings, ...siteRings.map((ring) => [...ring].reverse())],
    box: boxOfRings(rings),
  };
}

/** Makes the two measures of a study; they share the sweep's scratch memory. */
export function createLightMeasures() {
  const measureAreas = createWindingSweep(4);
  return {
    /** The area in m² outside everything that context blocks stand on. */
    openArea: (area: LitArea, contextFootprints: readonly Ring[]) =>
      openAreaM2(measureAreas, area, contextFootprints),
    /** Sun before and after, net new and removed shade, in one pass. */
    light: (area: LitArea, layer: ShadowLayer) => areaLight(measureAreas, area, layer),
  };
}

export type LightMeasures = ReturnType<typeof createLightMeasures>;

function openAreaM2(
  measureAreas: MeasureAreas,
  area: LitArea,
  contextFootprints: readonly Ring[],
): number {
  const areas = new Float64Array(1);
  measureAreas(
    [
      { counter: counters.area, rings: area.rings },
      { counter: counters.context, rings: contextFootprints },
    ],
    area.box,
    (windings) =>
      isInside(windings, counters.area) && !isInside(windings, counters.context) ? 0 : -1,
    areas,
  );
  return areas[0] ?? 0;
}

function areaLight(measureAreas: MeasureAreas, area: LitArea, layer: ShadowLayer): AreaLight {
  const areas = new Float64Array(3);
  const layers: SweepLayer[] = [{ counter: counters.area, rings: area.rings }];
  for (const shadow of layer.near(area.box)) layers.push(sweepLayerOf(shadow));
  measureAreas(layers, area.box, outcomeOf, areas);
  const [sunInBoth = 0, netNewM2 = 0, removedM2 = 0] = areas;
  return {
    sunBeforeM2: sunInBoth + netNewM2,
    sunAfterM2: sunInBoth + removedM2,
    netNewM2,
    removedM2,
  };
}

function sweepLayerOf({ role, contours }: BlockShadow): SweepLayer {
  return { counter: counters[role], rings: contours };
}

function outcomeOf(windings: Int32Array): number {
  if (!isInside(windings, counters.area) || isInside(windings, counters.context)) return -1;
  const shadedBefore = isInside(windings, counters.existing);
  const shadedAfter = isInside(windings, counters.proposed);
  if (!shadedBefore && !shadedAfter) return outcomes.sunInBoth;
  if (shadedAfter && !shadedBefore) return outcomes.netNew;
  if (shadedBefore && !shadedAfter) return outcomes.removed;
  return -1;
}

function isInside(windings: Int32Array, counter: number): boolean {
  return (windings[counter] ?? 0) > 0;
}
