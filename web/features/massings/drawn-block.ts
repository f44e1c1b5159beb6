import type { MultiPolygon, Polygon, Position } from 'geojson';
import type { MassingDetail } from '../../../shared/contracts/massings.ts';
import type { LngLat, Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';

/** A block with its footprint in plan alone, as drawings take it. */
export interface DrawnBlock extends Omit<MassingBlock, 'geometry'> {
  geometry: Polygonal;
}

/** Blocks as the file gave them: whatever stands behind longitude and latitude is left out. */
export function toDrawnBlocks(blocks: readonly MassingBlock[]): DrawnBlock[] {
  return blocks.map((block) => ({ ...block, geometry: inPlan(block.geometry) }));
}

/** Blocks as the server gives them. */
export function drawnBlocksOf({ features }: MassingDetail['blocks']): DrawnBlock[] {
  return features.map(({ properties, geometry }) => ({ ...properties, geometry }));
}

function inPlan(geometry: Polygon | MultiPolygon): Polygonal {
  const ring = (positions: Position[]) => positions.map(([lng = 0, lat = 0]): LngLat => [lng, lat]);
  return geometry.type === 'Polygon'
    ? { type: 'Polygon', coordinates: geometry.coordinates.map(ring) }
    : {
        type: 'MultiPolygon',
        coordinates: geometry.coordinates.map((polygon) => polygon.map(ring)),
      };
}
