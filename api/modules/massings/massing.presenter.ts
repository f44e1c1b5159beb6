import type {
  MassingComparison,
  MassingDetail,
  MassingSummary,
} from '../../../shared/contracts/massings.ts';
import { polygonalSchema } from '../../../shared/geometry/geojson-schema.ts';
import { compareMassings } from '../../../shared/massing/compare-massings.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { MassingRevision } from './massing-revision.entity.ts';

export function presentMassingSummary(massing: MassingRevision): MassingSummary {
  return {
    revision: massing.revision,
    fileName: massing.fileName,
    sizeBytes: massing.sizeBytes,
    sha256: massing.sha256,
    uploadedAt: massing.createdAt.toISOString(),
    uploadedByName: massing.uploadedBy.name,
    sound: massing.sound,
    figures: massing.figures,
  };
}

export function presentMassingDetail(massing: MassingRevision): MassingDetail {
  return {
    ...presentMassingSummary(massing),
    issues: massing.issues,
    blocks: { type: 'FeatureCollection', features: presentBlocks(massing.blocks) },
  };
}

/** Blocks as GeoJSON. */
export function presentBlocks(
  blocks: readonly MassingBlock[],
): MassingDetail['blocks']['features'] {
  return blocks.map(({ id, role, baseM, topM, storeys, name, geometry }) => ({
    type: 'Feature',
    properties: { id, role, baseM, topM, storeys, name },
    geometry: polygonalSchema.parse(geometry),
  }));
}

export function presentMassingComparison(
  from: MassingRevision,
  to: MassingRevision,
): MassingComparison {
  return {
    from: from.revision,
    to: to.revision,
    blocks: compareMassings(from.blocks, to.blocks),
    figuresBefore: from.figures,
    figuresAfter: to.figures,
  };
}
