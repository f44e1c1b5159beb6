import type { Box } from '../geometry/ring.ts';
import { blocksTowardSun } from '../shadow/blocks-toward-sun.ts';
import type { AreaLight } from '../shadow/receptor-light.ts';
import {
  createShadowCaster,
  type IndexedBlocks,
  type ShadowLayer,
} from '../shadow/shadow-layer.ts';
import { sunPositionAt, type SunPosition } from '../solar/sun-position.ts';
import type { StudyInput } from './evidence-schema.ts';
import { measureLight } from './measure-light.ts';
import type { Scene, SceneReceptor } from './scene.ts';

/** One instant of a scene: the sun, and the light on any receptor at any plane, each worked out once. */
export interface InstantLight {
  atMs: number;
  sun: SunPosition;
  /** The shadows on a plane; null with the sun down. */
  layerOn: (planeM: number) => ShadowLayer | null;
  lightOn: (receptor: SceneReceptor, planeM: number) => AreaLight;
}

/** The part of a scene in which light is asked for. */
export interface Reach {
  box: Box;
  lowestPlaneM: number;
}

interface Plane {
  layer: ShadowLayer;
  lights: Map<SceneReceptor, AreaLight>;
}

const noLight: AreaLight = { sunBeforeM2: 0, sunAfterM2: 0, netNewM2: 0, removedM2: 0 };

/**
 * Prepares one instant of a scene. With the sun down there is no light and no shadow.
 *
 * @param within the part of the scene that will be asked about; all of it when absent
 */
export function lightAtInstant(
  scene: Scene,
  blocks: IndexedBlocks,
  input: Pick<StudyInput, 'place'>,
  atMs: number,
  within?: Reach,
): InstantLight {
  const sun = sunPositionAt(atMs, input.place.longitude, input.place.latitude);
  const standing = () =>
    within === undefined ? blocks : blocksTowardSun(blocks, sun, within.box, within.lowestPlaneM);
  const castOn = sun.altitudeDeg > 0 ? createShadowCaster(standing(), sun) : null;
  const planes = new Map<number, Plane>();
  const onPlane = (planeM: number) => {
    if (castOn === null) return null;
    const plane: Plane = planes.get(planeM) ?? { layer: castOn(planeM), lights: new Map() };
    planes.set(planeM, plane);
    return plane;
  };
  return {
    atMs,
    sun,
    layerOn: (planeM) => onPlane(planeM)?.layer ?? null,
    lightOn: (receptor, planeM) => {
      const plane = onPlane(planeM);
      if (plane === null) return noLight;
      const known = plane.lights.get(receptor);
      if (known !== undefined) return known;
      const light = measureLight(scene, receptor, plane.layer, sun);
      plane.lights.set(receptor, light);
      return light;
    },
  };
}
