import { argon2id, hash as hashArgon2, verify as verifyArgon2 } from 'argon2';

/** Memory in KiB and passes over it. */
export interface PasswordCost {
  memoryCost: number;
  timeCost: number;
}

/** The first recommendation of OWASP's password storage guide for argon2id (from memory). */
const usualCost: PasswordCost = { memoryCost: 47_104, timeCost: 1 };

/** The hash that is stored for a password. */
export async function hashPassword(password: string, cost = usualCost): Promise<string> {
  return hashArgon2(password, { type: argon2id, parallelism: 1, ...cost });
}

let nobodysHash: Promise<string> | undefined;

/**
 * Whether this is the password. With no hash (nobody has this e-mail address) the answer is no,
 * after the same work: the time must not tell who has an account.
 */
export async function isPasswordRight(hash: string | null, password: string): Promise<boolean> {
  nobodysHash ??= hashPassword('the password of nobody');
  const isRight = await verifyArgon2(hash ?? (await nobodysHash), password);
  return hash !== null && isRight;
}
