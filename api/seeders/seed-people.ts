import type { EntityManager } from '@mikro-orm/postgresql';
import { hashPassword } from '../modules/people/passwords.ts';
import { Person } from '../modules/people/person.entity.ts';

export const demoPassword = 'larkhaven-demo';
const domain = 'larkhaven.example';

/** The accounts that are printed, each with what it is for; the first applicant of the cases is `applicant@`. */
export const demoAccounts = [
  { email: `applicant@${domain}`, role: 'applicant', name: 'Ilse Vantwistle' },
  { email: `planner@${domain}`, role: 'planner', name: 'Corin Thrushwick' },
  { email: `board@${domain}`, role: 'board', name: 'Edda Lanternby' },
  { email: `admin@${domain}`, role: 'administrator', name: 'Sorrel Oarfield' },
] as const;

/** Whether an address belongs to the demo: nobody real can have it (RFC 2606). */
export function isDemoAddress(email: string): boolean {
  return email.endsWith(`@${domain}`);
}

/** An address of the demo for somebody of this name. */
export function demoAddressOf(name: string): string {
  return `${name.toLowerCase().replace(/[^a-z]+/g, '.')}@${domain}`;
}

/** The accounts but for the administrator's, and one for each other applicant of the cases. */
export async function seedPeople(em: EntityManager, applicants: readonly string[]): Promise<void> {
  const passwordHash = await hashPassword(demoPassword);
  const accounts = demoAccounts.filter(({ role }) => role !== 'administrator');
  const named = new Set<string>(accounts.map(({ name }) => name));
  const others = [...new Set(applicants)]
    .filter((name) => !named.has(name))
    .map((name) => ({ email: demoAddressOf(name), role: 'applicant' as const, name }));
  for (const account of [...accounts, ...others]) em.create(Person, { ...account, passwordHash });
  await em.flush();
}

/** The administrator's account; it comes last and says that the demo data is complete. */
export async function seedAdministrator(em: EntityManager): Promise<void> {
  const passwordHash = await hashPassword(demoPassword);
  for (const account of demoAccounts) {
    if (account.role === 'administrator') em.create(Person, { ...account, passwordHash });
  }
  await em.flush();
}
