import { describe, expect, it } from 'vitest';
import { codesOf, feature, issueOf, lngLatAt, readFeatures, rectangle } from '../drawn-massing.ts';

describe('GeoJSON coordinates', () => {
  it.each([
    ['a ring that is no list', [5], '5'],
    ['an empty ring', [[]], '[]'],
    ['a point of one number', [[[1], [2, 3], [4, 5], [1]]], '[1]'],
    ['a point of texts', [[['1', '2']]], '["1","2"]'],
    ['a point that is null', [[null]], 'null'],
  ])('with %s are refused and quoted', (_, coordinates, quoted) => {
    const { blocks, issues } = readFeatures(feature({ id: 'p1', top: 9 }, coordinates));
    expect(blocks).toEqual([]);
    expect(issueOf(issues, 'MASSING_COORDINATE_INVALID').message).toContain(quoted);
  });

  it('beyond all numbers are refused', () => {
    const text = JSON.stringify(feature({ top: 9 })).replace(/-91\.\d+/, '1e999');
    const { issues } = readFeatures(JSON.parse(text));
    expect(codesOf(issues)).toContain('MASSING_COORDINATE_INVALID');
  });

  it('with latitude before longitude are told so, with the place they mean', () => {
    const turned = rectangle(10, 10, 20, 15).map(([lng, lat]) => [lat, lng]);
    const { blocks, issues } = readFeatures(feature({ id: 'p1', top: 9 }, [turned]));
    expect(blocks).toEqual([]);
    const issue = issueOf(issues, 'MASSING_COORDINATES_SWAPPED');
    expect(issue.lngLat).toEqual(lngLatAt(10, 10));
    expect(issue.suggestion).toContain('longitude first');
  });

  it.each([
    [
      'UTM metres',
      [
        [629800, 5178900],
        [629830, 5178900],
        [629830, 5178920],
        [629800, 5178900],
      ],
    ],
    [
      'a local drawing that leaves the range',
      [
        [10, 20],
        [60, 20],
        [60, 120],
        [10, 20],
      ],
    ],
  ])('in %s are told to look projected', (_, points) => {
    const { blocks, issues } = readFeatures(feature({ id: 'p1', top: 9 }, [points]));
    expect(blocks).toEqual([]);
    const issue = issueOf(issues, 'MASSING_COORDINATES_PROJECTED');
    expect(issue.message).toContain('metres or feet');
    expect(issue.suggestion).toContain('WGS 84');
  });
});
