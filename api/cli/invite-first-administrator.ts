import { parseEnv } from '../env.ts';
import { inviteFirstAdministrator } from '../modules/people/invite-first-administrator.ts';
import { createOrm } from '../orm.ts';

/** Prints a one-time link for the first administrator; nothing where there is one already. */
const env = parseEnv(process.env);
const orm = await createOrm(env.DATABASE_OWNER_URL);
try {
  const token = await inviteFirstAdministrator(orm.em.fork(), new Date());
  if (token !== null) {
    const link = new URL('/invitation', env.PUBLIC_URL);
    link.searchParams.set('token', token);
    console.log(
      `The first administrator sets a password here, once, within 48 hours:\n  ${link.href}`,
    );
  }
} finally {
  await orm.close();
}
