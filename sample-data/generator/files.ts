import { brokenMassingBytes } from './broken-massing.ts';
import { twoTierBlock } from './case-massings.ts';
import { writeCases } from './cases.ts';
import { cityJsonBytes } from './city-json.ts';
import { buildCity, LARKHAVEN_SEED, type City } from './city.ts';
import { areaFeature, collectionBytes, jsonBytes, lineFeature, polygonFeature } from './geojson.ts';
import { kmlBytes } from './kml.ts';
import { massingBytes } from './massing.ts';
import { common, without } from './overlay.ts';
import { streets } from './plan-streets.ts';
import { creek, lake, sheet, sheetShape } from './plan-water.ts';
import { place, toLngLat } from './plane.ts';
import type { Shape } from './shape.ts';
import { shapefileZipBytes } from './shapefile.ts';

function municipality() {
  return {
    name: 'City of Larkhaven',
    shortName: 'Larkhaven',
    timeZone: 'America/Chicago',
    ...place,
    elevationM: 186,
    locale: 'en-US',
    extent: [...toLngLat([sheet.west, sheet.south]), ...toLngLat([sheet.east, sheet.north])],
  };
}

function waterBytes(): Uint8Array {
  const onSheet = (shape: Shape): Shape[] => common(shape, [sheetShape]);
  return collectionBytes([
    areaFeature(onSheet(lake), { name: 'Lake Merrowick' }),
    areaFeature(without(creek, [lake]).flatMap(onSheet), { name: 'Wickmoor Creek' }),
  ]);
}

function baseDataFiles(city: City): [string, Uint8Array][] {
  const addressOf = new Map(city.parcels.map(({ number, address }) => [number, address]));
  return [
    ['municipality.json', jsonBytes(municipality())],
    [
      'parcels.geojson',
      collectionBytes(
        city.parcels.map(({ shape, number, address, zone, use }) =>
          polygonFeature(shape, { number, address, zone, use }),
        ),
      ),
    ],
    [
      'buildings.geojson',
      collectionBytes(
        city.buildings.map(({ shape, ...building }) => polygonFeature(shape, building)),
      ),
    ],
    [
      'yards.geojson',
      collectionBytes(
        city.yards.map(({ shape, id, parcel, label }) =>
          polygonFeature(shape, { id, parcel, address: addressOf.get(parcel), label }),
        ),
      ),
    ],
    [
      'open-space.geojson',
      collectionBytes(city.openSpaces.map(({ shape, ...space }) => polygonFeature(shape, space))),
    ],
    [
      'collectors.geojson',
      collectionBytes(
        city.collectors.map(({ shape, id, building, parcel, ...plane }) =>
          polygonFeature(shape, {
            id,
            building,
            address: addressOf.get(parcel),
            class: 'collector',
            ...plane,
          }),
        ),
      ),
    ],
    [
      'streets.geojson',
      collectionBytes(city.streetSurfaces.map(({ name, pieces }) => areaFeature(pieces, { name }))),
    ],
    [
      'street-lines.geojson',
      collectionBytes(streets.map(({ name, centreLine }) => lineFeature(centreLine, { name }))),
    ],
    ['water.geojson', waterBytes()],
  ];
}

/** Every generated file of the sample, by its path within `sample-data/`. The same files each time. */
export function generateFiles(): Map<string, Uint8Array> {
  const city = buildCity(LARKHAVEN_SEED);
  const { cases, massings } = writeCases(city);
  const files = new Map<string, Uint8Array>();
  for (const [name, bytes] of baseDataFiles(city)) files.set(`larkhaven/${name}`, bytes);
  files.set('larkhaven/cases.json', jsonBytes({ cases }));
  for (const { fileName, blocks } of [...massings, ...twoTierBlock(city).massings]) {
    files.set(`massings/${fileName}`, massingBytes(blocks));
  }
  const tallowWharf = massings.find(({ fileName }) => fileName === 'tallow-wharf.geojson');
  if (!tallowWharf) throw new Error('The massing of Tallow Wharf Lofts is missing.');
  const title = 'Tallow Wharf Lofts';
  files.set('massings/tallow-wharf.kml', kmlBytes(title, tallowWharf.blocks));
  files.set(
    'massings/tallow-wharf-feet.zip',
    shapefileZipBytes('tallow-wharf-feet', tallowWharf.blocks),
  );
  files.set('massings/tallow-wharf.city.json', cityJsonBytes(title, tallowWharf.blocks));
  files.set('massings/broken-five-ways.geojson', brokenMassingBytes(city, [148, -172]));
  return files;
}
