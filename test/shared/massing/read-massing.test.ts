import { describe, expect, it } from 'vitest';
import { massingLimits } from '../../../shared/massing/massing-limits.ts';
import { readMassing } from '../../../shared/massing/read-massing.ts';
import { bytesOf, codesOf, feature, issueOf, read } from './drawn-massing.ts';

const sample = { type: 'FeatureCollection', features: [feature({ id: 'p1', base: 0, top: 45 })] };

describe('readMassing', () => {
  it('reads GeoJSON whatever the file is called', () => {
    const reading = read(sample, 'tower.kml');
    expect(reading.ok).toBe(true);
    expect(reading.issues).toEqual([]);
    expect(reading.blocks).toMatchObject([{ id: 'p1', role: 'proposed', baseM: 0, topM: 45 }]);
  });

  it('reads GeoJSON with a byte order mark and leading white space', () => {
    expect(read(`\uFEFF \n${JSON.stringify(sample)}`).blocks).toHaveLength(1);
  });

  it('refuses an empty file', () => {
    const reading = readMassing(new Uint8Array(), 'tower.geojson');
    expect(reading.ok).toBe(false);
    expect(issueOf(reading.issues, 'MASSING_FILE_EMPTY').message).toBe('tower.geojson is empty.');
  });

  it('refuses a file beyond the limit without looking into it, and names both sizes', () => {
    const reading = readMassing(new Uint8Array(massingLimits.fileBytes + 1024 * 1024), 'a.json');
    expect(codesOf(reading.issues)).toEqual(['MASSING_FILE_TOO_LARGE']);
    expect(reading.issues[0]?.message).toContain('26.0 MB; at most 25.0 MB');
  });

  it.each([
    ['little-endian with its mark', [0xff, 0xfe], true],
    ['big-endian with its mark', [0xfe, 0xff], false],
    ['little-endian without a mark', [], true],
    ['big-endian without a mark', [], false],
  ])('refuses UTF-16, %s', (_, mark, isLittleEndian) => {
    const text = JSON.stringify(sample);
    const bytes = Uint8Array.from([
      ...mark,
      ...Array.from(text).flatMap((character) => {
        const code = character.charCodeAt(0);
        return isLittleEndian ? [code & 255, code >> 8] : [code >> 8, code & 255];
      }),
    ]);
    const { issues } = readMassing(bytes, 'tower.geojson');
    expect(issueOf(issues, 'MASSING_ENCODING').message).toContain('UTF-16');
  });

  it('refuses bytes that are not UTF-8', () => {
    // é in Latin-1
    const bytes = bytesOf(JSON.stringify(sample).replace('p1', 'p#'));
    bytes[bytes.indexOf('#'.charCodeAt(0))] = 0xe9;
    const { issues } = readMassing(bytes, 'tower.geojson');
    expect(issueOf(issues, 'MASSING_ENCODING').suggestion).toContain('UTF-8');
  });

  it.each([
    ['a ZIP archive', [0x50, 0x4b, 0x03, 0x04]],
    ['a Shapefile', [0x00, 0x00, 0x27, 0x0a]],
    ['a gzip archive', [0x1f, 0x8b, 0x08]],
    ['a GeoPackage', 'SQLite format 3\0'],
    ['a PDF document', '%PDF-1.7'],
    ['an IFC model', 'ISO-10303-21;\nHEADER;'],
    ['a DWG drawing', 'AC1032'],
    ['a SketchUp model', [0xff, 0xfe, 0xff, 0x0e, 0x53, 0x00]],
    ['a Rhino model', '3D Geometry File Format        7'],
    ['a DXF drawing', '  0\r\nSECTION\r\n  2\r\nHEADER'],
    ['KML', '<?xml version="1.0"?>\n<kml xmlns="http://www.opengis.net/kml/2.2">'],
    [
      'CityGML',
      '<?xml version="1.0"?><core:CityModel xmlns:core="http://www.opengis.net/citygml/2.0">',
    ],
    ['XML', '<?xml version="1.0"?><plan/>'],
    ['a table (CSV)', 'id,base,top\r\np1,0,45\r\n'],
    ['CityJSON', '{"version":"2.0","type":"CityJSON","CityObjects":{}}'],
    ['TopoJSON', '{"type":"Topology","objects":{}}'],
    ['Esri JSON', '{"geometryType":"esriGeometryPolygon","features":[]}'],
  ])('says that %s is not read yet and what to send instead', (name, content) => {
    const bytes = typeof content === 'string' ? bytesOf(content) : Uint8Array.from(content);
    const reading = readMassing(bytes, 'tower.geojson');
    expect(reading.ok).toBe(false);
    const issue = issueOf(reading.issues, 'MASSING_FORMAT_NOT_READ');
    expect(issue.message).toContain(`tower.geojson is ${name}`);
    expect(issue.message).toContain('not read yet');
    expect(issue.suggestion).toContain('GeoJSON');
  });

  it('says so when it knows nothing of a file', () => {
    const { issues } = readMassing(Uint8Array.from([1, 2, 3, 4]), 'tower');
    expect(codesOf(issues)).toEqual(['MASSING_FORMAT_UNKNOWN']);
  });

  it('lists an issue 25 times and then says how often more it was found', () => {
    const features = Array.from({ length: 30 }, (_, index) => feature({ id: `p${index}` }));
    const { issues } = read({ type: 'FeatureCollection', features });
    expect(issues).toHaveLength(26);
    expect(issues[25]?.message).toContain('found 5 more times');
    expect(issues[25]?.severity).toBe('error');
  });
});
