import { describe, expect, it } from 'vitest';
import { readMassingFile } from '../../../../web/features/massings/read-massing-file.ts';

const square = (west: number, south: number, size: number) => ({
  type: 'Polygon' as const,
  coordinates: [
    [
      [west, south],
      [west + size, south],
      [west + size, south + size],
      [west, south + size],
      [west, south],
    ] as [number, number][],
  ],
});

const site = {
  parcels: [square(-91.301, 46.75, 0.001)],
  extent: [-91.31, 46.74, -91.29, 46.76] as [number, number, number, number],
  longitude: -91.3,
  latitude: 46.75,
};

function fileOf(geometry: unknown): File {
  const content = {
    type: 'FeatureCollection',
    features: [
      {
        type: 'Feature',
        properties: { id: 'b1', role: 'proposed', base: 0, top: 12, storeys: 4 },
        geometry,
      },
    ],
  };
  return new File([JSON.stringify(content)], 'house.geojson');
}

describe('a massing file read in the browser', () => {
  it('gives blocks, figures and soundness before anything is sent', async () => {
    const reading = await readMassingFile(fileOf(square(-91.3007, 46.7503, 0.0003)), site);
    expect(reading.isSound).toBe(true);
    expect(reading.blocks.map(({ id, topM }) => [id, topM])).toEqual([['b1', 12]]);
    expect(reading.figures?.heightM).toBe(12);
    expect(reading.figures?.storeys).toBe(4);
  });

  it('is not sound where a block stands off the site', async () => {
    const reading = await readMassingFile(fileOf(square(-91.305, 46.7503, 0.0003)), site);
    expect(reading.isSound).toBe(false);
    expect(reading.issues.some(({ severity }) => severity === 'error')).toBe(true);
  });

  it('says what is the matter with a file that is no massing, and has no figures', async () => {
    const reading = await readMassingFile(new File(['no massing'], 'notes.txt'), site);
    expect(reading.isSound).toBe(false);
    expect(reading.figures).toBeNull();
    expect(reading.issues).not.toHaveLength(0);
  });
});
