import type { EntityManager } from '@mikro-orm/postgresql';
import type { Request, RequestHandler, Response } from 'express';
import { Passport } from 'passport';
import { Strategy } from 'passport-local';
import { AppError } from '../../errors.ts';
import { isPasswordRight } from './passwords.ts';
import { Person } from './person.entity.ts';

/** Who has this e-mail address and password. Throws SIGN_IN_FAILED, the same for either being wrong. */
export async function authenticate(
  em: EntityManager,
  request: Request,
  response: Response,
): Promise<Person> {
  return new Promise((resolve, reject) => {
    const passport = new Passport();
    let found: Person | null = null;
    passport.use(
      new Strategy({ usernameField: 'email', session: false }, (email, password, done) => {
        findPersonByPassword(em, email, password).then(
          (person) => {
            found = person;
            done(null, person ?? false);
          },
          (error: unknown) => done(error),
        );
      }),
    );
    const run = passport.authenticate('local', { session: false }, (error: unknown) => {
      if (error instanceof Error) reject(error);
      else if (found === null) reject(new AppError('SIGN_IN_FAILED'));
      else resolve(found);
    }) as RequestHandler;
    void run(request, response, reject);
  });
}

async function findPersonByPassword(
  em: EntityManager,
  email: string,
  password: string,
): Promise<Person | null> {
  const person = await em.findOne(Person, { email: email.trim().toLowerCase() });
  const isRight = await isPasswordRight(person?.passwordHash ?? null, password);
  return isRight ? person : null;
}
