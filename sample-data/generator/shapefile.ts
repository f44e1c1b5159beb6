import { zipSync } from 'fflate';
import proj4 from 'proj4';
import { dbfBytes, type DbfField } from './dbf.ts';
import { textBytes } from './geojson.ts';
import type { Block } from './massing.ts';
import { toLngLat } from './plane.ts';
import { clockwise, counterClockwise, type Ring } from './shape.ts';
import { stateplaneWkt, toSurveyFeet } from './survey-feet.ts';

/*
 * Polygons written by the “ESRI Shapefile Technical Description”, an ESRI White Paper, July 1998: a header of
 * 100 bytes in which the file code, the length and nothing else are big-endian; records with a big-endian
 * header of two integers; lengths and offsets counted in 16-bit words; outer rings clockwise, holes
 * counter-clockwise, every ring closed.
 */
const FILE_CODE = 9994;
const VERSION = 1000;
const POLYGON = 5;
const FILE_HEADER_BYTES = 100;
const RECORD_HEADER_BYTES = 8;
/** Shape type, bounding box, number of parts, number of points. */
const POLYGON_HEAD_BYTES = 4 + 32 + 4 + 4;

type Position = [number, number];
type Box = [number, number, number, number];

const toStateplane = (lngLat: Position): Position => {
  const [x, y] = proj4('EPSG:4326', stateplaneWkt, lngLat);
  return [x, y];
};

/** In US survey feet, from the rounded degrees that the GeoJSON has. */
function closedInFeet(ring: Ring): Position[] {
  const corners = ring.map((corner) => toStateplane(toLngLat(corner)));
  const first = corners[0];
  return first ? [...corners, first] : [];
}

function boxOf(points: readonly Position[]): Box {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)];
}

function polygonContent(rings: readonly Position[][]): Uint8Array<ArrayBuffer> {
  const points = rings.flat();
  const bytes = new Uint8Array(POLYGON_HEAD_BYTES + 4 * rings.length + 16 * points.length);
  const view = new DataView(bytes.buffer);
  view.setInt32(0, POLYGON, true);
  boxOf(points).forEach((value, index) => view.setFloat64(4 + 8 * index, value, true));
  view.setInt32(36, rings.length, true);
  view.setInt32(40, points.length, true);
  let firstPoint = 0;
  rings.forEach((ring, index) => {
    view.setInt32(POLYGON_HEAD_BYTES + 4 * index, firstPoint, true);
    firstPoint += ring.length;
  });
  const pointsAt = POLYGON_HEAD_BYTES + 4 * rings.length;
  points.forEach(([x, y], index) => {
    view.setFloat64(pointsAt + 16 * index, x, true);
    view.setFloat64(pointsAt + 16 * index + 8, y, true);
  });
  return bytes;
}

function fileWithHeader(lengthBytes: number, box: Box): Uint8Array<ArrayBuffer> {
  const bytes = new Uint8Array(lengthBytes);
  const view = new DataView(bytes.buffer);
  view.setInt32(0, FILE_CODE);
  view.setInt32(24, lengthBytes / 2);
  view.setInt32(28, VERSION, true);
  view.setInt32(32, POLYGON, true);
  box.forEach((value, index) => view.setFloat64(36 + 8 * index, value, true));
  return bytes;
}

function mainAndIndexFiles(polygons: readonly Position[][][]): {
  shp: Uint8Array<ArrayBuffer>;
  shx: Uint8Array<ArrayBuffer>;
} {
  const contents = polygons.map(polygonContent);
  const contentBytes = contents.reduce((sum, one) => sum + RECORD_HEADER_BYTES + one.length, 0);
  const box = boxOf(polygons.flat(2));
  const shp = fileWithHeader(FILE_HEADER_BYTES + contentBytes, box);
  const shx = fileWithHeader(FILE_HEADER_BYTES + RECORD_HEADER_BYTES * contents.length, box);
  const shpView = new DataView(shp.buffer);
  const shxView = new DataView(shx.buffer);
  let at = FILE_HEADER_BYTES;
  contents.forEach((content, index) => {
    shpView.setInt32(at, index + 1);
    shpView.setInt32(at + 4, content.length / 2);
    shp.set(content, at + RECORD_HEADER_BYTES);
    const indexAt = FILE_HEADER_BYTES + RECORD_HEADER_BYTES * index;
    shxView.setInt32(indexAt, at / 2);
    shxView.setInt32(indexAt + 4, content.length / 2);
    at += RECORD_HEADER_BYTES + content.length;
  });
  return { shp, shx };
}

const fields: readonly DbfField<Block>[] = [
  { name: 'ID', type: 'C', width: 16, decimals: 0, value: ({ id }) => id },
  { name: 'NAME', type: 'C', width: 32, decimals: 0, value: ({ name }) => name },
  { name: 'ROLE', type: 'C', width: 10, decimals: 0, value: ({ role }) => role },
  { name: 'BASE_FT', type: 'N', width: 10, decimals: 2, value: ({ baseM }) => toSurveyFeet(baseM) },
  { name: 'TOP_FT', type: 'N', width: 10, decimals: 2, value: ({ topM }) => toSurveyFeet(topM) },
  { name: 'STOREYS', type: 'N', width: 4, decimals: 0, value: ({ storeys }) => storeys },
];

/** A massing as a zipped Shapefile in state plane feet, heights in feet as attributes. */
export function shapefileZipBytes(baseName: string, blocks: readonly Block[]): Uint8Array {
  const polygons = blocks.map(({ shape }) =>
    [clockwise(shape.outer), ...shape.holes.map(counterClockwise)].map(closedInFeet),
  );
  const { shp, shx } = mainAndIndexFiles(polygons);
  // A date of the local clock: the archive stores the civil time, so the bytes agree in every time zone.
  const mtime = new Date(2026, 0, 5, 12, 0, 0);
  return zipSync(
    {
      [`${baseName}.shp`]: shp,
      [`${baseName}.shx`]: shx,
      [`${baseName}.dbf`]: dbfBytes(fields, blocks),
      [`${baseName}.prj`]: textBytes(stateplaneWkt),
    },
    { level: 9, mtime },
  );
}
