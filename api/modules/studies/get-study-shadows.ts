import type { EntityManager } from '@mikro-orm/postgresql';
import type { InstantShadows } from '../../../shared/contracts/studies.ts';
import type { Clipper } from '../../../shared/shadow/clipper.ts';
import { presentShadows } from '../../../shared/study/present-shadows.ts';
import { castShadowsAt } from '../../../shared/study/shadows-at.ts';
import { AppError } from '../../errors.ts';
import type { Actor } from '../../policy.ts';
import { makeShadowsValid } from '../../valid-polygons.ts';
import { getFinishedStudy } from './get-study.ts';
import { readStoredInput } from './read-evidence.ts';
import { StudyInstant } from './study-instant.entity.ts';

/**
 * The shadows on the ground at one instant: as stored where the study lists it, otherwise computed from
 * the study's own input. Throws INSTANT_INVALID with the sun down.
 */
export async function getStudyShadows(
  em: EntityManager,
  clipper: Clipper,
  actor: Actor | null,
  id: string,
  at: string,
): Promise<InstantShadows> {
  const study = await getFinishedStudy(em, actor, id);
  const stored = await em.findOne(
    StudyInstant,
    { study: study.id, at: new Date(at) },
    { populate: ['shadows'] },
  );
  const shadows = stored?.shadows ?? null;
  if (shadows !== null) return shadows;

  await em.populate(study, ['evidence']);
  const drawn = castShadowsAt(readStoredInput(study), at, clipper);
  if (drawn === null) throw new AppError('INSTANT_INVALID');
  return presentShadows(await makeShadowsValid(drawn));
}
