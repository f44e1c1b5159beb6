import { describe, expect, it } from 'vitest';
import { massingLimits } from '../../../../shared/massing/massing-limits.ts';
import { codesOf, feature, issueOf, read, readFeatures, rectangle } from '../drawn-massing.ts';

describe('the GeoJSON document', () => {
  it('may be a FeatureCollection', () => {
    expect(readFeatures(feature({ top: 9 }), feature({ top: 12 })).blocks).toHaveLength(2);
  });

  it('may be a single Feature', () => {
    expect(read(feature({ id: 'p1', top: 9 })).blocks).toMatchObject([{ id: 'p1', topM: 9 }]);
  });

  it('may be a bare geometry, which then lacks its heights', () => {
    const { blocks, issues } = read({ type: 'Polygon', coordinates: [rectangle(0, 0, 5, 5)] });
    expect(blocks).toEqual([]);
    expect(issueOf(issues, 'MASSING_TOP_MISSING').feature).toBe('feature 1');
  });

  it('is refused as invalid JSON with line and column', () => {
    const { ok, issues } = read('{"type": "FeatureCollection",\n "features": [ }');
    expect(ok).toBe(false);
    expect(issueOf(issues, 'MASSING_JSON_INVALID').message).toMatch(/\(line 2, column \d+\)/);
  });

  it('is refused with a word about NaN where that stands in it', () => {
    const { issues } = read('{"type":"Feature","properties":{"top": NaN},"geometry":null}');
    expect(issueOf(issues, 'MASSING_JSON_INVALID').suggestion).toContain('NaN');
  });

  it('is refused when it was cut off', () => {
    const text = JSON.stringify(feature({ top: 9 }));
    expect(codesOf(read(text.slice(0, -20)).issues)).toEqual(['MASSING_JSON_INVALID']);
  });

  it.each(['[', '{"a":'])('is refused when it nests without end: %s', (open) => {
    const { issues } = read(open.repeat(200_000));
    expect(codesOf(issues)).toEqual(['MASSING_JSON_TOO_DEEP']);
  });

  it('may hold brackets in its texts', () => {
    const name = `${'['.repeat(100)}"\\`;
    expect(read(feature({ id: 'p1', name, top: 9 })).blocks).toMatchObject([{ name }]);
  });

  it.each([
    ['a list', [feature({ top: 9 })], 'no GeoJSON'],
    ['another object', { type: 'Plan' }, 'no GeoJSON'],
    ['a FeatureCollection without features', { type: 'FeatureCollection' }, 'without a list'],
  ])('is refused when it is %s', (_, value, sentence) => {
    const { ok, issues } = read(value);
    expect(ok).toBe(false);
    expect(issueOf(issues, 'MASSING_GEOJSON_TYPE').message).toContain(sentence);
  });

  it('is refused when it holds no features', () => {
    expect(codesOf(readFeatures().issues)).toEqual(['MASSING_NO_FEATURES']);
  });

  it('is refused beyond the number of features', () => {
    const { ok, issues } = readFeatures(...new Array<object>(massingLimits.features + 1).fill({}));
    expect(ok).toBe(false);
    expect(issueOf(issues, 'MASSING_TOO_MANY_FEATURES').message).toContain('5001');
  });

  it('is refused beyond the number of points, and read at it', () => {
    const circle = (points: number) =>
      Array.from({ length: points }, (_, index) => {
        const turn = (index % (points - 1)) * ((2 * Math.PI) / (points - 1));
        return [-91.3 + 0.001 * Math.cos(turn), 46.75 + 0.001 * Math.sin(turn)];
      });
    const { vertices } = massingLimits;
    expect(readFeatures(feature({ top: 9 }, [circle(vertices)])).blocks).toHaveLength(1);
    const beyond = readFeatures(feature({ top: 9 }, [circle(vertices + 1)]));
    expect(beyond.ok).toBe(false);
    expect(issueOf(beyond.issues, 'MASSING_TOO_MANY_VERTICES').message).toContain('20001');
  });

  it.each([
    'urn:ogc:def:crs:OGC:1.3:CRS84',
    'urn:ogc:def:crs:EPSG::4326',
    'EPSG:4326',
    'http://www.opengis.net/def/crs/EPSG/0/4326',
  ])('may name WGS 84 in the old crs member: %s', (name) => {
    const crs = { type: 'name', properties: { name } };
    const reading = read({ type: 'FeatureCollection', crs, features: [feature({ top: 9 })] });
    expect(reading.blocks).toHaveLength(1);
  });

  it.each([
    [{ type: 'name', properties: { name: 'urn:ogc:def:crs:EPSG::26915' } }, '26915'],
    [{ type: 'name', properties: { name: 'EPSG:14326' } }, '14326'],
    [{ type: 'link', properties: { href: 'crs.prj' } }, 'does not name'],
  ])('is refused when its crs member names another system: %j', (crs, word) => {
    const { ok, issues } = read({
      type: 'FeatureCollection',
      crs,
      features: [feature({ top: 9 })],
    });
    expect(ok).toBe(false);
    const issue = issueOf(issues, 'MASSING_CRS_NOT_READ');
    expect(issue.message).toContain(word);
    expect(issue.suggestion).toContain('WGS 84');
  });

  it('says once for all blocks that heights in coordinates were left out', () => {
    const raised = [rectangle(0, 0, 5, 5).map((point) => [...point, 12])];
    const { blocks, issues } = readFeatures(
      feature({ id: 'a', top: 9, base: 0 }, raised),
      feature({ id: 'b', top: 9, base: 0 }, raised),
    );
    expect(blocks[0]?.geometry.coordinates).toEqual([rectangle(0, 0, 5, 5)]);
    const issue = issueOf(issues, 'MASSING_HEIGHTS_IN_COORDINATES');
    expect(issue.severity).toBe('warning');
    expect(issue.message).toContain('Block a and 1 more');
  });
});
