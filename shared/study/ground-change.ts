import { joinBoxes, type Box, type Ring } from '../geometry/ring.ts';
import { makeLitArea } from '../shadow/receptor-light.ts';
import type { ShadowLayer } from '../shadow/shadow-layer.ts';
import { pointFromFrame, type SunFrame } from '../shadow/sun-frame.ts';
import type { Scene } from './scene.ts';

/**
 * What is shaded only after (net new) and only before (removed) on the ground at datum 0, in m²,
 * outside the site and the context that stands on the ground.
 *
 * @param layer the shadows on the plane at datum 0
 */
export function areaChangesOnGround(
  scene: Scene,
  layer: ShadowLayer,
): { netNewM2: number; removedM2: number } {
  const changing = layer.shadows.filter(({ role }) => role !== 'context');
  const [first] = changing;
  if (first === undefined) return { netNewM2: 0, removedM2: 0 };
  const box = changing.reduce((joined, shadow) => joinBoxes(joined, shadow.box), first.box);
  // Context that stands on the ground lies in its own shadow, so only the site need be cut away.
  const area = makeLitArea([cornersOf(box, layer.frame)], scene.siteRings);
  return scene.measures.light(area, layer);
}

/** A box of a sun's frame as a ring on the local plane. */
function cornersOf({ minX, minY, maxX, maxY }: Box, frame: SunFrame): Ring {
  return [
    pointFromFrame(minX, minY, frame),
    pointFromFrame(maxX, minY, frame),
    pointFromFrame(maxX, maxY, frame),
    pointFromFrame(minX, maxY, frame),
  ];
}
