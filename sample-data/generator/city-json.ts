import proj4 from 'proj4';
import { jsonBytes } from './geojson.ts';
import type { Block } from './massing.ts';
import { toLngLat } from './plane.ts';

const UTM_15_NORTH = '+proj=utm +zone=15 +datum=WGS84 +units=m +no_defs';
const REFERENCE_SYSTEM = 'https://www.opengis.net/def/crs/EPSG/0/32615';
const SCALE_M = 0.001;

type Vertex = [number, number, number];

interface CityObject {
  type: 'Building' | 'BuildingPart';
  attributes: Record<string, string | number>;
  parents?: string[];
  geometry: { type: 'Solid'; lod: '1'; boundaries: number[][][][] }[];
}

/** Collects vertices as whole millimetres from an origin, each once. */
function createVertexList(origin: Vertex) {
  const vertices: Vertex[] = [];
  const known = new Map<string, number>();
  return {
    vertices,
    indexOf([x, y, z]: Vertex): number {
      const vertex: Vertex = [
        Math.round((x - origin[0]) / SCALE_M),
        Math.round((y - origin[1]) / SCALE_M),
        Math.round((z - origin[2]) / SCALE_M),
      ];
      const key = vertex.join();
      const index = known.get(key) ?? vertices.length;
      if (index === vertices.length) {
        known.set(key, index);
        vertices.push(vertex);
      }
      return index;
    },
  };
}

function toUtm(lngLat: [number, number]): [number, number] {
  const [x, y] = proj4(UTM_15_NORTH, lngLat);
  return [x, y];
}

/** Floor, walls and roof of a prism, each face counter-clockwise as seen from outside. */
function prismFaces(floor: readonly number[], roof: readonly number[]): number[][][] {
  const walls = floor.map((corner, index) => {
    const next = (index + 1) % floor.length;
    return [[corner, floor[next], roof[next], roof[index]].filter((one) => one !== undefined)];
  });
  return [[[...floor].reverse()], ...walls, [[...roof]]];
}

/**
 * A massing as CityJSON 2.0 (OGC 20-072r5): one building of several parts and what is removed as buildings
 * of their own, solids of level of detail 1, on UTM zone 15 North; z is the height above the site's ground.
 */
export function cityJsonBytes(title: string, blocks: readonly Block[]): Uint8Array {
  const rings = blocks.map(({ shape }) => shape.outer.map((corner) => toUtm(toLngLat(corner))));
  const xs = rings.flat().map(([x]) => x);
  const ys = rings.flat().map(([, y]) => y);
  const origin: Vertex = [Math.floor(Math.min(...xs)), Math.floor(Math.min(...ys)), 0];
  const list = createVertexList(origin);
  const objects = blocks.map((block, index): [string, CityObject] => {
    if (block.shape.holes.length > 0) throw new Error(`${block.id} has a courtyard.`);
    const ring = rings[index] ?? [];
    const floor = ring.map(([x, y]) => list.indexOf([x, y, block.baseM]));
    const roof = ring.map(([x, y]) => list.indexOf([x, y, block.topM]));
    const isPart = block.role === 'proposed';
    return [
      block.id,
      {
        type: isPart ? 'BuildingPart' : 'Building',
        attributes: {
          name: block.name,
          role: block.role,
          storeysAboveGround: block.storeys,
          measuredHeight: block.topM,
        },
        ...(isPart ? { parents: ['proposal'] } : {}),
        geometry: [{ type: 'Solid', lod: '1', boundaries: [prismFaces(floor, roof)] }],
      },
    ];
  });
  const parts = blocks.filter(({ role }) => role === 'proposed').map(({ id }) => id);
  const topM = Math.max(...blocks.map((block) => block.topM));
  return jsonBytes({
    type: 'CityJSON',
    version: '2.0',
    metadata: {
      title,
      referenceSystem: REFERENCE_SYSTEM,
      geographicalExtent: [
        Math.min(...xs),
        Math.min(...ys),
        0,
        Math.max(...xs),
        Math.max(...ys),
        topM,
      ].map((value) => Math.round(value * 1000) / 1000),
    },
    transform: { scale: [SCALE_M, SCALE_M, SCALE_M], translate: origin },
    CityObjects: {
      proposal: { type: 'Building', attributes: { name: title }, children: parts },
      ...Object.fromEntries<CityObject>(objects),
    },
    vertices: list.vertices,
  });
}
