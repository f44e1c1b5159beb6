import { describe, expect, it } from 'vitest';
import { codesOf, feature, issueOf, lngLatAt, readFeatures, rectangle } from '../drawn-massing.ts';

const sound = feature({ id: 'sound', base: 0, top: 9 });

describe('a GeoJSON feature', () => {
  it('becomes a block with id, name, role, heights and storeys', () => {
    const properties = { id: 'p1', name: 'Tower', role: 'proposed', base: 3, top: 45, storeys: 14 };
    expect(readFeatures(feature(properties))).toEqual({
      ok: true,
      issues: [],
      blocks: [
        {
          id: 'p1',
          name: 'Tower',
          role: 'proposed',
          baseM: 3,
          topM: 45,
          storeys: 14,
          geometry: { type: 'Polygon', coordinates: [rectangle(10, 10, 20, 15)] },
        },
      ],
    });
  });

  it('keeps holes and the parts of a MultiPolygon', () => {
    const hole = rectangle(2, 2, 4, 4).reverse();
    const parts = [[rectangle(0, 0, 10, 10), hole], [rectangle(20, 0, 5, 5)]];
    const { blocks, issues } = readFeatures(
      feature({ id: 'm', base: 0, top: 9 }, parts, 'MultiPolygon'),
    );
    expect(issues).toEqual([]);
    expect(blocks[0]?.geometry).toEqual({ type: 'MultiPolygon', coordinates: parts });
  });

  it('takes the id of its properties before its own, and a number as text', () => {
    const { blocks } = readFeatures(
      { ...feature({ id: 'inner', top: 9 }), id: 'outer' },
      { ...feature({ top: 9 }), id: 7 },
    );
    expect(blocks.map(({ id }) => id)).toEqual(['inner', '7']);
  });

  it('is named by its id, else its name, else its place in the file', () => {
    const { issues } = readFeatures(
      feature({ id: 'p1', name: 'Tower' }),
      feature({ name: 'Podium' }),
      feature({}),
    );
    expect(issues.map((issue) => issue.feature)).toEqual(['p1', 'Podium', 'feature 3']);
    expect(issues.map(({ message }) => message)).toEqual([
      'Block p1 (Tower) has no top height.',
      'Block Podium has no top height.',
      'Feature 3 has no top height.',
    ]);
  });

  it('keeps sentences short where an id is long', () => {
    const { issues } = readFeatures(feature({ id: 'x'.repeat(5000) }));
    expect(issueOf(issues, 'MASSING_TOP_MISSING').message.length).toBeLessThan(200);
  });

  it.each(['Point', 'LineString', 'MultiPoint', 'MultiLineString', 'Circle'])(
    'that is a %s is named, placed and left out',
    (type) => {
      const coordinates = type.startsWith('Multi') ? [[[-91.3, 46.75]]] : [-91.3, 46.75];
      const { blocks, issues } = readFeatures(
        sound,
        feature({ id: 'x', top: 9 }, coordinates, type),
      );
      expect(blocks.map(({ id }) => id)).toEqual(['sound']);
      const issue = issueOf(issues, 'MASSING_GEOMETRY_NOT_A_FOOTPRINT');
      expect(issue).toMatchObject({ severity: 'error', feature: 'x', lngLat: [-91.3, 46.75] });
      expect(issue.message).toContain(type);
    },
  );

  it('that is a GeometryCollection is placed and left out', () => {
    const geometries = [{ type: 'Polygon', coordinates: [rectangle(3, 4, 5, 5)] }];
    const { blocks, issues } = readFeatures(sound, {
      type: 'Feature',
      properties: { id: 'x', top: 9 },
      geometry: { type: 'GeometryCollection', geometries },
    });
    expect(blocks).toHaveLength(1);
    const issue = issueOf(issues, 'MASSING_GEOMETRY_COLLECTION');
    expect(issue.lngLat).toEqual(lngLatAt(3, 4));
  });

  it.each([
    [
      'no geometry',
      { type: 'Feature', properties: {}, geometry: null },
      'MASSING_GEOMETRY_MISSING',
    ],
    ['no coordinates', feature({}, []), 'MASSING_GEOMETRY_MISSING'],
    ['no feature', { type: 'Polygon' }, 'MASSING_FEATURE_INVALID'],
    ['no object', 5, 'MASSING_FEATURE_INVALID'],
  ])('with %s is refused alone', (_, value, code) => {
    const { ok, blocks, issues } = readFeatures(value, sound);
    expect(ok).toBe(true);
    expect(blocks.map(({ id }) => id)).toEqual(['sound']);
    expect(codesOf(issues)).toEqual([code]);
  });

  it('that is wrong in its shape and in its properties is told both', () => {
    const { issues } = readFeatures(feature({ role: 'nice' }, [[[0, 0]]]));
    expect(codesOf(issues)).toEqual([
      'MASSING_TOO_FEW_POINTS',
      'MASSING_ROLE_UNKNOWN',
      'MASSING_TOP_MISSING',
    ]);
  });
});
