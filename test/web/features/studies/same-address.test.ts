import { describe, expect, it } from 'vitest';
import { receptorsAtSameAddress } from '../../../../web/features/studies/same-address.ts';

const geometry = { type: 'Polygon' as const, coordinates: [] };
const evidence = {
  receptors: {
    features: [
      { id: 'LH-1', class: 'parcel', label: '12 Tallowreed Row' },
      { id: 'LH-2', class: 'parcel', label: '2 Tallowreed Row' },
      { id: 'Y-1', class: 'yard', label: 'Rear yard, 12 Tallowreed Row' },
      { id: 'S-1', class: 'collector', label: '12 Tallowreed Row' },
    ].map((properties) => ({ properties, geometry })),
  },
};

describe('receptors at the same address', () => {
  it('are the yard, then the parcel, then the collector, and none of a like address', () => {
    expect(receptorsAtSameAddress(evidence, 'LH-1').map(({ id }) => id)).toEqual([
      'Y-1',
      'LH-1',
      'S-1',
    ]);
  });

  it('are found from the yard as well', () => {
    expect(receptorsAtSameAddress(evidence, 'Y-1')).toHaveLength(3);
  });

  it('are none where the study does not know the receptor', () => {
    expect(receptorsAtSameAddress(evidence, 'LH-9')).toEqual([]);
  });
});
