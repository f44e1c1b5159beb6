import { describe, expect, it } from 'vitest';
import type { MassingDetail } from '../../../../shared/contracts/massings.ts';
import { listCompleteness } from '../../../../web/features/cases/completeness.ts';

const application = {
  siteParcels: [{ number: 'LH-0001', address: '2 Oarlock Shore' }],
  description: 'Fourteen storeys on a podium.',
};
const massing: Pick<MassingDetail, 'revision' | 'fileName' | 'issues' | 'figures'> = {
  revision: 2,
  fileName: 'tower.geojson',
  issues: [],
  figures: {
    proposedBlocks: 2,
    existingBlocks: 1,
    heightM: 44,
    storeys: 14,
    footprintM2: 900,
    volumeM3: 20_000,
  },
};
const missing = (items: ReturnType<typeof listCompleteness>) =>
  items.filter((item) => !item.isThere).map((item) => item.what);

describe('listCompleteness', () => {
  it('misses nothing in a sound application', () => {
    expect(missing(listCompleteness(application, massing))).toEqual([]);
  });

  it('names what is not there', () => {
    expect(missing(listCompleteness({ siteParcels: [], description: ' ' }, null))).toEqual([
      'Site',
      'Description',
      'Massing',
    ]);
    const figures = { ...massing.figures, heightM: null, storeys: null };
    expect(missing(listCompleteness(application, { ...massing, figures }))).toEqual([
      'Heights',
      'Storeys',
    ]);
  });

  it('counts what must be corrected, and lets a remark pass', () => {
    const issue = (severity: 'error' | 'warning') => ({
      code: 'MASSING_RING_OPEN',
      severity,
      feature: null,
      lngLat: null,
      message: 'A ring is open.',
      suggestion: '',
    });
    const unsound = listCompleteness(application, { ...massing, issues: [issue('error')] });
    expect(missing(unsound)).toEqual(['Massing sound']);
    const remarked = listCompleteness(application, { ...massing, issues: [issue('warning')] });
    expect(missing(remarked)).toEqual([]);
    expect(remarked.some(({ note }) => note.includes('1 remark'))).toBe(true);
  });
});
