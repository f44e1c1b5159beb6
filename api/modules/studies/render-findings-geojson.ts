import type { FeatureCollection } from 'geojson';
import type { FindingRow } from '../../../shared/contracts/studies.ts';
import type { ReceptorGeometry } from '../../../shared/geometry/geojson-schema.ts';
import type { StudyInput } from '../../../shared/study/evidence-schema.ts';

/** The findings table as GeoJSON: a feature for each receptor and row, with the columns as properties. */
export function renderFindingsGeojson(
  rows: readonly FindingRow[],
  receptors: StudyInput['receptors'],
): FeatureCollection<ReceptorGeometry | null, FindingRow> {
  const geometries = new Map(
    receptors.features.map(({ properties, geometry }) => [properties.id, geometry]),
  );
  return {
    type: 'FeatureCollection',
    features: rows.map((row) => ({
      type: 'Feature',
      properties: row,
      geometry: geometries.get(row.receptor) ?? null,
    })),
  };
}
