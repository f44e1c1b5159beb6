import type { EntityManager } from '@mikro-orm/postgresql';
import type { Person as PersonDetail } from '../../../shared/contracts/people.ts';
import { Person } from './person.entity.ts';
import { presentPerson } from './person.presenter.ts';

/** Who the session belongs to, or null for the public. */
export async function findActor(
  em: EntityManager,
  personId: string | undefined,
): Promise<PersonDetail | null> {
  if (personId === undefined) return null;
  const person = await em.findOne(Person, { id: personId });
  return person === null ? null : presentPerson(person);
}
