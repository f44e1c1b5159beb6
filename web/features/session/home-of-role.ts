import type { Role } from '../../../shared/contracts/people.ts';
import { paths } from '../../app/paths.ts';

const homes = {
  applicant: paths.applications.href(),
  planner: paths.desk.href(),
  board: paths.hearings.href(),
  administrator: paths.desk.href(),
} as const satisfies Record<Role, string>;

/** Where somebody begins after signing in. */
export function homeOfRole(role: Role): string {
  return homes[role];
}

/** The address to go on to, if it is one of ours: a link from elsewhere cannot lead away. */
export function safeNext(next: string | null): string | null {
  return next !== null && /^\/(?![/\\])/.test(next) ? next : null;
}
