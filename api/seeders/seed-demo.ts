import { Person } from '../modules/people/person.entity.ts';
import { readSampleCases, readSampleCity } from './read-sample-data.ts';
import { seedCase } from './seed-case.ts';
import type { Stage } from './seed-case.ts';
import { seedCity } from './seed-city.ts';
import {
  demoAccounts,
  demoPassword,
  isDemoAddress,
  seedAdministrator,
  seedPeople,
} from './seed-people.ts';

/**
 * Fills an empty database with the demo town and says which accounts there are. Where an earlier run
 * was interrupted, what it left is cleared first; a database with anybody else's data is left alone.
 */
export async function seedDemo(stage: Stage): Promise<string[]> {
  const { orm } = stage;
  const people = await orm.em.fork().findAll(Person);
  if (people.length > 0) {
    const isComplete = people.some(({ role }) => role === 'administrator');
    if (!people.every(({ email }) => isDemoAddress(email))) return [];
    if (isComplete) return describeAccounts();
    await orm.schema.clearDatabase();
  }
  const cases = await readSampleCases();
  await seedCity(orm.em.fork(), await readSampleCity(), new Date());
  await seedPeople(
    orm.em.fork(),
    cases.map(({ applicant }) => applicant),
  );
  for (const one of cases) await seedCase(stage, one);
  await seedAdministrator(orm.em.fork());
  return describeAccounts();
}

function describeAccounts(): string[] {
  return [
    `Demo accounts, all with the password ${demoPassword}:`,
    ...demoAccounts.map(({ email, role }) => `  ${email} (${role})`),
  ];
}
