import { unzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { massingProperties, readAreas, readBytes, toMetres } from './sample-files.ts';

/*
 * A small reader of its own, by the ESRI Shapefile Technical Description (July 1998), and the projection back
 * by the formulas of Snyder, “Map Projections: A Working Manual”, USGS Professional Paper 1395 (1987),
 * equations 7-9, 14-15, 15-9 and 15-11, with the parameters of NAD83 / Wisconsin North in US survey feet
 * (EPSG:2287). Nothing of it is shared with the writer.
 */
const files = unzipSync(readBytes('massings/tallow-wharf-feet.zip'));
const viewOf = (name: string): DataView => {
  const bytes = files[`tallow-wharf-feet.${name}`] ?? new Uint8Array();
  return new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
};
const shp = viewOf('shp');
const shx = viewOf('shx');
const dbf = viewOf('dbf');
const blocks = readAreas('massings/tallow-wharf.geojson', massingProperties);
const metresPerFoot = 1200 / 3937;

interface ShpRecord {
  number: number;
  offsetBytes: number;
  contentBytes: number;
  box: number[];
  rings: [number, number][][];
}

function readRecords(): ShpRecord[] {
  const records: ShpRecord[] = [];
  for (let at = 100; at < shp.byteLength;) {
    const contentBytes = shp.getInt32(at + 4) * 2;
    const content = at + 8;
    expect(shp.getInt32(content, true)).toBe(5);
    const parts = shp.getInt32(content + 36, true);
    const points = shp.getInt32(content + 40, true);
    const starts = Array.from({ length: parts }, (_, part) =>
      shp.getInt32(content + 44 + 4 * part, true),
    );
    const pointAt = (index: number): [number, number] => {
      const place = content + 44 + 4 * parts + 16 * index;
      return [shp.getFloat64(place, true), shp.getFloat64(place + 8, true)];
    };
    records.push({
      number: shp.getInt32(at),
      offsetBytes: at,
      contentBytes,
      box: readBox(shp, content + 4),
      rings: starts.map((start, part) =>
        Array.from({ length: (starts[part + 1] ?? points) - start }, (_, index) =>
          pointAt(start + index),
        ),
      ),
    });
    at = content + contentBytes;
  }
  return records;
}

function readBox(view: DataView, at: number): number[] {
  return [0, 8, 16, 24].map((step) => view.getFloat64(at + step, true));
}

const rad = Math.PI / 180;

/** Lambert conformal conic with two standard parallels, backwards: US survey feet to degrees. */
function fromStateplane([xFeet, yFeet]: readonly [number, number]): [number, number] {
  const a = 6378137;
  const f = 1 / 298.257222101;
  const e = Math.sqrt(2 * f - f * f);
  const [phi0, phi1, phi2] = [45 + 10 / 60, 45 + 34 / 60, 46 + 46 / 60].map((deg) => deg * rad);
  const m = (phi = NaN) => Math.cos(phi) / Math.sqrt(1 - (e * Math.sin(phi)) ** 2);
  const t = (phi = NaN) =>
    Math.tan(Math.PI / 4 - phi / 2) /
    ((1 - e * Math.sin(phi)) / (1 + e * Math.sin(phi))) ** (e / 2);
  const n = (Math.log(m(phi1)) - Math.log(m(phi2))) / (Math.log(t(phi1)) - Math.log(t(phi2)));
  const F = m(phi1) / (n * t(phi1) ** n);
  const rho0 = a * F * t(phi0) ** n;
  const x = xFeet * metresPerFoot - 600_000;
  const y = yFeet * metresPerFoot;
  const rho = Math.hypot(x, rho0 - y);
  const theta = Math.atan2(x, rho0 - y);
  const ts = (rho / (a * F)) ** (1 / n);
  let phi = Math.PI / 2 - 2 * Math.atan(ts);
  for (let round = 0; round < 10; round++) {
    const eSin = e * Math.sin(phi);
    phi = Math.PI / 2 - 2 * Math.atan(ts * ((1 - eSin) / (1 + eSin)) ** (e / 2));
  }
  return [theta / n / rad - 90, phi / rad];
}

describe('the zipped Shapefile', () => {
  it('holds the four files under one name', () => {
    expect(Object.keys(files)).toEqual(
      ['shp', 'shx', 'dbf', 'prj'].map((name) => `tallow-wharf-feet.${name}`),
    );
  });

  it('has headers that state the code, the length, the version and the shape type', () => {
    for (const view of [shp, shx]) {
      expect(view.getInt32(0)).toBe(9994);
      expect(view.getInt32(24) * 2).toBe(view.byteLength);
      expect(view.getInt32(28, true)).toBe(1000);
      expect(view.getInt32(32, true)).toBe(5);
    }
    expect(readBox(shx, 36)).toEqual(readBox(shp, 36));
  });

  it('has a record for each block, found by the index, with the box of its points', () => {
    const records = readRecords();
    expect(records.map(({ number }) => number)).toEqual(blocks.map((_, index) => index + 1));
    records.forEach(({ offsetBytes, contentBytes, box, rings }, index) => {
      expect(shx.getInt32(100 + 8 * index) * 2).toBe(offsetBytes);
      expect(shx.getInt32(104 + 8 * index) * 2).toBe(contentBytes);
      const points = rings.flat();
      const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
      expect(box).toEqual([Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)]);
    });
    const boxes = records.map(({ box }) => box);
    const edge = (side: number, most: (...values: number[]) => number) =>
      most(...boxes.map((box) => box[side] ?? NaN));
    expect(readBox(shp, 36)).toEqual([
      edge(0, Math.min),
      edge(1, Math.min),
      edge(2, Math.max),
      edge(3, Math.max),
    ]);
  });

  it('has outer rings that run clockwise and are closed', () => {
    for (const { rings } of readRecords()) {
      for (const ring of rings) {
        expect(ring.at(-1)).toEqual(ring[0]);
        const doubled = ring
          .slice(1)
          .reduce(
            (sum, [x, y], index) =>
              sum + (x - (ring[index]?.[0] ?? NaN)) * (y + (ring[index]?.[1] ?? NaN)),
            0,
          );
        expect(doubled).toBeGreaterThan(0);
      }
    }
  });

  it('comes back to the longitudes and latitudes of the GeoJSON within a centimetre', () => {
    readRecords().forEach(({ rings }, index) => {
      const geometry = blocks[index]?.geometry;
      const wanted = geometry?.type === 'Polygon' ? (geometry.coordinates[0] ?? []) : [];
      const found = (rings[0] ?? []).map(fromStateplane);
      expect(found).toHaveLength(wanted.length);
      for (const [lng = NaN, lat = NaN] of wanted) {
        const place = toMetres([lng, lat]);
        const gaps = found.map((one) => {
          const [x, y] = toMetres(one);
          return Math.hypot(x - place[0], y - place[1]);
        });
        expect(Math.min(...gaps)).toBeLessThan(0.01);
      }
    });
  });

  it('gives the heights in US survey feet beside the roles', () => {
    const headerBytes = dbf.getUint16(8, true);
    const rowBytes = dbf.getUint16(10, true);
    expect(dbf.getUint32(4, true)).toBe(blocks.length);
    expect(headerBytes + rowBytes * blocks.length + 1).toBe(dbf.byteLength);
    const text = (at: number, length: number): string =>
      new TextDecoder().decode(new Uint8Array(dbf.buffer, dbf.byteOffset + at, length));
    const fields = Array.from({ length: (headerBytes - 33) / 32 }, (_, index) => ({
      name: text(32 * (index + 1), 11).replaceAll('\0', ''),
      width: dbf.getUint8(32 * (index + 1) + 16),
    }));
    expect(fields.map(({ name }) => name)).toEqual([
      'ID',
      'NAME',
      'ROLE',
      'BASE_FT',
      'TOP_FT',
      'STOREYS',
    ]);
    blocks.forEach(({ properties }, row) => {
      let at = headerBytes + rowBytes * row + 1;
      const values = fields.map(({ name, width }) => {
        const value = text(at, width).trim();
        at += width;
        return [name, value] as const;
      });
      const record = Object.fromEntries(values);
      expect(record.ID).toBe(properties.id);
      expect(record.ROLE).toBe(properties.role);
      expect(Number(record.STOREYS)).toBe(properties.storeys);
      expect(Number(record.BASE_FT) * metresPerFoot).toBeCloseTo(properties.base, 2);
      expect(Number(record.TOP_FT) * metresPerFoot).toBeCloseTo(properties.top, 2);
    });
  });
});
