import type { EntityManager } from '@mikro-orm/postgresql';
import type { SetUpMunicipalityInput } from '../../../shared/contracts/base-data.ts';
import { AppError } from '../../errors.ts';
import { Municipality } from './municipality.entity.ts';

/** Says which place this server serves, once: studies and base data stand on it afterwards. */
export async function setUpMunicipality(
  em: EntityManager,
  input: SetUpMunicipalityInput,
): Promise<Municipality> {
  return em.transactional(async (inner) => {
    if ((await inner.count(Municipality)) > 0) throw new AppError('MUNICIPALITY_SET_UP');
    const municipality = inner.create(Municipality, input);
    await inner.flush();
    return municipality;
  });
}
