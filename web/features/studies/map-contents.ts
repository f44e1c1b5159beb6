import type { FindingRow } from '../../../shared/contracts/studies.ts';
import { isPolygonal } from '../../../shared/geometry/geojson-schema.ts';
import type { MapBlock, MapReceptor, MapVolume } from '../../map/map-features.ts';
import type { DrawnEvidence } from './api/get-study-evidence.ts';
import { worstFinding } from './sun-losers.ts';

/** The site's blocks of a study as the map draws them. */
export function mapBlocksOf(evidence: DrawnEvidence): MapBlock[] {
  return evidence.blocks.features.flatMap(({ properties, geometry }): MapBlock[] => {
    const { id, role, base: baseM, top: topM } = properties;
    return role === 'proposed' || role === 'existing' ? [{ id, role, baseM, topM, geometry }] : [];
  });
}

/** What the study takes to stand around the site, for the tilted view. */
export function mapSurroundingsOf(evidence: DrawnEvidence): MapVolume[] {
  return evidence.blocks.features
    .filter(({ properties }) => properties.role === 'context')
    .map(({ properties: { id, base: baseM, top: topM }, geometry }) => ({
      id,
      baseM,
      topM,
      geometry,
    }));
}

/** Every receptor of a study with the worst of its findings. */
export function mapReceptorsOf(
  evidence: DrawnEvidence,
  rows: readonly FindingRow[],
): MapReceptor[] {
  const findings = new Map<string, FindingRow['finding'][]>();
  for (const { receptor, finding } of rows) {
    findings.set(receptor, [...(findings.get(receptor) ?? []), finding]);
  }
  // Windows have no area to be drawn.
  return evidence.receptors.features.flatMap(({ properties, geometry }) =>
    isPolygonal(geometry)
      ? [{ ...properties, finding: worstFinding(findings.get(properties.id) ?? []), geometry }]
      : [],
  );
}
