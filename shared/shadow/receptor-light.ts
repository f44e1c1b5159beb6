import { boxOfFlatRings, flattenRings, type FlatRings } from '../geometry/flat-rings.ts';
import { boxesOverlap, boxOfRings, type Box, type Ring } from '../geometry/ring.ts';
import type { ShadowLayer } from './shadow-layer.ts';
import { turnIntoFrame } from './sun-frame.ts';
import { createWindingSweep, type WindingSweep } from './winding-sweep.ts';

/** A place to be judged: what lies in its rings on the local plane and not in the site's. */
export interface LitArea {
  /** Counter-clockwise rings are counted in, clockwise ones out. */
  rings: readonly Ring[];
  siteRings: readonly Ring[];
  /** The box around `rings`. */
  box: Box;
  /** Both kinds of rings, the receptor's first. */
  flat: FlatRings;
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

const counters = { area: 0, site: 1, context: 2, existing: 3, proposed: 4 } as const;

/** The three areas that a sweep adds up, and the sets of counters that belong to each. */
const outcomes = { sunInBoth: 0, netNew: 1, removed: 2 } as const;
const outcomeOf = new Int8Array(32).fill(-1);
outcomeOf[bits('area')] = outcomes.sunInBoth;
outcomeOf[bits('area', 'proposed')] = outcomes.netNew;
outcomeOf[bits('area', 'existing')] = outcomes.removed;

/** An area to be judged: a receptor less the site, since what lies on the site is not judged there. */
export function makeLitArea(rings: readonly Ring[], siteRings: readonly Ring[]): LitArea {
  const box = boxOfRings(rings);
  const near = siteRings.filter((ring) => boxesOverlap(boxOfRings([ring]), box));
  return { rings, siteRings: near, box, flat: flattenRings([...rings, ...near]) };
}

/** Makes the two measures of a study; they share the sweep's scratch memory. */
export function createLightMeasures() {
  const sweep = createWindingSweep(5);
  const areas = new Float64Array(3);
  let turned = new Float64Array(256);
  return {
    /** The area in m² outside everything that context blocks stand on. */
    openArea: (area: LitArea, contextFootprints: readonly Ring[]): number => {
      const footprints = flattenRings(contextFootprints);
      sweep.start(area.box);
      addArea(sweep, area, area.flat.points);
      for (const ring of footprints.rings) {
        sweep.addRing(footprints.points, ring, counters.context);
      }
      sweep.measure(outcomeOf, areas.fill(0));
      return areas[outcomes.sunInBoth] ?? 0;
    },
    /** Sun before and after, net new and removed shade, in one pass. */
    light: (area: LitArea, layer: ShadowLayer): AreaLight => {
      const { points, rings } = area.flat;
      if (turned.length < points.length) turned = new Float64Array(points.length * 2);
      turnIntoFrame(points, layer.frame, turned);
      const box = boxOfFlatRings(turned, rings, area.rings.length);
      sweep.start(box);
      addArea(sweep, area, turned);
      addShadows(sweep, layer, box);
      sweep.measure(outcomeOf, areas.fill(0));
      const [sunInBoth = 0, netNewM2 = 0, removedM2 = 0] = areas;
      return {
        sunBeforeM2: sunInBoth + netNewM2,
        sunAfterM2: sunInBoth + removedM2,
        netNewM2,
        removedM2,
      };
    },
  };
}

export type LightMeasures = ReturnType<typeof createLightMeasures>;

function addArea(sweep: WindingSweep, { rings, flat }: LitArea, points: Float64Array): void {
  for (let index = 0; index < flat.rings.length; index += 1) {
    const ring = flat.rings[index];
    if (ring === undefined) continue;
    sweep.addRing(points, ring, index < rings.length ? counters.area : counters.site);
  }
}

function addShadows(sweep: WindingSweep, layer: ShadowLayer, box: Box): void {
  for (const index of layer.near(box)) {
    const shadow = layer.shadows[index];
    if (shadow === undefined) continue;
    const counter = counters[shadow.role];
    for (const ring of shadow.rings) {
      sweep.addRing(layer.points, ring, counter, shadow.farShiftM, shadow.nearShiftM);
    }
  }
}

function bits(...names: (keyof typeof counters)[]): number {
  return names.reduce((set, name) => set | (1 << counters[name]), 0);
}
