import type { EntityManager } from '@mikro-orm/postgresql';
import type { ReceptorDetail } from '../../../shared/contracts/studies.ts';
import { computeReceptorLedger } from '../../../shared/study/receptor-ledger.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { getFinishedStudy } from './get-study.ts';
import { readStoredInput } from './read-evidence.ts';

/** One receptor of a study: its findings and its sun ledger. Throws NOT_FOUND where the study has no such receptor. */
export async function getReceptor(
  em: EntityManager,
  actor: Actor | null,
  id: string,
  receptor: string,
): Promise<ReceptorDetail> {
  const study = await getFinishedStudy(em, actor, id, ['evidence', 'findingRows']);
  const input = readStoredInput(study);
  if (!input.receptors.features.some(({ properties }) => properties.id === receptor)) {
    throw new AppError('NOT_FOUND', {
      title: `The study has no receptor ${receptor}: it lies beyond the reach of the shadows, or is no receptor.`,
    });
  }
  return {
    findings: (study.findingRows ?? []).filter((row) => row.receptor === receptor),
    ledger: computeReceptorLedger(input, receptor),
  };
}
