/** A parcel of Larkhaven that no sample case stands on. */
export const site = { address: '23 Tallowreed Row', neighbour: '25 Tallowreed Row' };

const [lng, lat] = [-91.2976078, 46.7514455];

function block(id: string, halfLng: number, halfLat: number, base: number, top: number) {
  return {
    type: 'Feature',
    properties: { id, role: 'proposed', base, top, storeys: Math.round(top / 3), name: id },
    geometry: {
      type: 'Polygon',
      coordinates: [
        [
          [lng - halfLng, lat - halfLat],
          [lng + halfLng, lat - halfLat],
          [lng + halfLng, lat + halfLat],
          [lng - halfLng, lat + halfLat],
          [lng - halfLng, lat - halfLat],
        ],
      ],
    },
  };
}

const upper = block('upper', 0.00008, 0.00005, 12, 42);

/** A block of two tiers, 42 m high, that is in none of the sample files. */
export const twoTierMassing = {
  name: 'two-tiers.geojson',
  content: {
    type: 'FeatureCollection',
    features: [block('lower', 0.000096, 0.000064, 0, 12), upper],
  },
};

/** The same with the upper tier's base above its top. */
export const upsideDownMassing = {
  name: 'upside-down.geojson',
  content: {
    type: 'FeatureCollection',
    features: [{ ...upper, properties: { ...upper.properties, base: 45 } }],
  },
};
