import type { AreaLight } from '../shadow/receptor-light.ts';
import { shadowVector } from '../shadow/shadow-contours.ts';
import { castShadowLayer, type SceneBlock, type ShadowLayer } from '../shadow/shadow-layer.ts';
import { sunPositionAt, type SunPosition } from '../solar/sun-position.ts';
import type { StudyInput } from './evidence-schema.ts';
import type { Scene, SceneReceptor } from './scene.ts';

/** One instant of a scene: the sun, and the light on any receptor at any plane, each worked out once. */
export interface InstantLight {
  atMs: number;
  sun: SunPosition;
  /** The shadows on a plane; null with the sun down. */
  layerOn: (planeM: number) => ShadowLayer | null;
  lightOn: (receptor: SceneReceptor, planeM: number) => AreaLight;
}

const noLight: AreaLight = { sunBeforeM2: 0, sunAfterM2: 0, netNewM2: 0, removedM2: 0 };

/** Prepares one instant of a scene. With the sun down there is no light and no shadow. */
export function lightAtInstant(
  scene: Scene,
  blocks: readonly SceneBlock[],
  input: Pick<StudyInput, 'place'>,
  atMs: number,
): InstantLight {
  const sun = sunPositionAt(atMs, input.place.longitude, input.place.latitude);
  const isUp = sun.altitudeDeg > 0;
  const layers = new Map<number, ShadowLayer>();
  const lights = new Map<string, AreaLight>();
  const layerOn = (planeM: number): ShadowLayer | null => {
    if (!isUp) return null;
    const layer = layers.get(planeM) ?? castShadowLayer(blocks, shadowVector(sun), planeM);
    layers.set(planeM, layer);
    return layer;
  };
  return {
    atMs,
    sun,
    layerOn,
    lightOn: (receptor, planeM) => {
      const layer = layerOn(planeM);
      if (layer === null) return noLight;
      const key = `${planeM} ${receptor.id}`;
      const light = lights.get(key) ?? scene.measures.light(receptor.area, layer);
      lights.set(key, light);
      return light;
    },
  };
}
