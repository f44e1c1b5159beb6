import { evidenceFileSchema } from '../../../shared/study/evidence-schema.ts';
import type { EvidenceFile, StudyInput } from '../../../shared/study/evidence-schema.ts';
import type { Study } from './study.entity.ts';

/** The evidence file of a finished study, loaded with its evidence. */
export function readEvidence(study: Study): EvidenceFile {
  return evidenceFileSchema.parse(JSON.parse(study.evidence ?? ''));
}

/** What the study was computed from: the evidence without its results. */
export function readStoredInput(study: Study): StudyInput {
  const { results: _results, digest: _digest, ...input } = readEvidence(study);
  return input;
}
