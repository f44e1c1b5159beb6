import { heightSources, toDecimetre, type BuildingDraft } from './building.ts';
import { frameOf, frameRectangle } from './lots.ts';
import { common } from './overlay.ts';
import type { Parcel } from './parcels.ts';
import type { Random } from './random.ts';

/** A main-street building from one side line to the other, so that neighbours share their walls. */
export function buildShop(parcel: Parcel, random: Random): BuildingDraft[] {
  const frame = frameOf(parcel);
  const depthM = random.between(15, 19);
  const storeys = random.pick([2, 2, 3, 3, 3, 4]);
  const topM = toDecimetre(Math.min(14, Math.max(8, storeys * 3.3 + random.between(0.6, 2))));
  const [front] = common(parcel.shape, [frameRectangle(frame, [-100, 100], [-100, depthM])]);
  if (!front) return [];
  const buildings: BuildingDraft[] = [
    {
      kind: 'shop',
      storeys,
      baseM: 0,
      topM,
      heightSource: random.pick([heightSources.lidarFlat, heightSources.permit]),
      shape: front,
    },
  ];
  if (random.chance(0.35)) {
    const annexeM: [number, number] = [depthM, depthM + random.between(4, 8)];
    const [annexe] = common(parcel.shape, [frameRectangle(frame, [-100, 100], annexeM)]);
    if (annexe) {
      buildings.push({
        kind: 'shop',
        storeys: 1,
        baseM: 0,
        topM: toDecimetre(random.between(3.6, 4.6)),
        heightSource: heightSources.lidarFlat,
        shape: annexe,
      });
    }
  }
  return buildings;
}
