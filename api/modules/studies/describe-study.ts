import type { EntityManager } from '@mikro-orm/postgresql';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { findCurrentMassing } from '../massings/get-massing.ts';
import { getMunicipality } from '../settings/get-municipality.ts';
import { StudyInstant } from './study-instant.entity.ts';
import type { Study } from './study.entity.ts';
import { presentStudy } from './study.presenter.ts';

/** A study with all that its page shows but the table, the shadows and the evidence. */
export async function describeStudy(em: EntityManager, study: Study): Promise<StudyDetail> {
  const current = await findCurrentMassing(em, study.reviewCase);
  return presentStudy(study, {
    municipality: await getMunicipality(em),
    instants: await em.find(
      StudyInstant,
      { study: study.id },
      { orderBy: { position: 'asc' }, populate: [] },
    ),
    isCurrent: current?.id === study.massing.id,
  });
}
