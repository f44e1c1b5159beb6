import type { AreaLight } from '../shadow/receptor-light.ts';
import type { ShadowLayer } from '../shadow/shadow-layer.ts';
import { isInFront } from '../shadow/window-front.ts';
import type { SunPosition } from '../solar/sun-position.ts';
import type { SceneReceptor } from './scene-receptor.ts';
import type { Scene } from './scene.ts';

const noLight: AreaLight = { sunBeforeM2: 0, sunAfterM2: 0, netNewM2: 0, removedM2: 0 };

/**
 * The light on a receptor at one instant: in m² of its area, for a window in shares of it. A window
 * has none while the sun stands behind its wall.
 */
export function measureLight(
  { measures, sampler }: Pick<Scene, 'measures' | 'sampler'>,
  { area, front }: Pick<SceneReceptor, 'area' | 'front'>,
  layer: ShadowLayer,
  sun: SunPosition,
): AreaLight {
  if (front === null) return measures.light(area, layer);
  if (!isInFront(front, sun)) return noLight;
  const { before, after } = sampler(front.points, layer);
  const light = { ...noLight };
  const part = 1 / front.points.count;
  before.forEach((wasLit, point) => {
    const isLit = after[point] ?? 0;
    light.sunBeforeM2 += wasLit * part;
    light.sunAfterM2 += isLit * part;
    if (wasLit > isLit) light.netNewM2 += part;
    if (wasLit < isLit) light.removedM2 += part;
  });
  return light;
}

/** The share of a receptor that would be in sun with no building at all. */
export function openShare({ front }: Pick<SceneReceptor, 'front'>, sun: SunPosition): number {
  return front === null || isInFront(front, sun) ? 1 : 0;
}
