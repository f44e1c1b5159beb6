import type { Role } from '../../../shared/contracts/people.ts';
import { paths } from '../paths.ts';

interface NavigationEntry {
  to: string;
  label: string;
  end?: boolean;
}

const cases: NavigationEntry = { to: paths.home.href(), label: 'Open cases', end: true };
const method: NavigationEntry = { to: paths.method.href(), label: 'Method' };
const desk: NavigationEntry = { to: paths.desk.href(), label: 'Desk' };
const hearings: NavigationEntry = { to: paths.hearings.href(), label: 'Hearings' };
const rules: NavigationEntry = { to: paths.adminRules.href(), label: 'Rule' };
const applications: NavigationEntry = { to: paths.applications.href(), label: 'My applications' };

const entriesByRole = {
  applicant: [cases, applications, method],
  planner: [cases, desk, hearings, rules, method],
  board: [cases, hearings, method],
  administrator: [cases, desk, hearings, rules, method],
} as const satisfies Record<Role, readonly NavigationEntry[]>;

/** Where a person of this role has something to do; null is the public. */
export function navigationFor(role: Role | null): readonly NavigationEntry[] {
  return role === null ? [cases, method] : entriesByRole[role];
}
