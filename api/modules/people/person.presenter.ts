import type { Person as PersonDetail } from '../../../shared/contracts/people.ts';
import type { Person } from './person.entity.ts';

export function presentPerson(person: Person): PersonDetail {
  return { id: person.id, name: person.name, email: person.email, role: person.role };
}
