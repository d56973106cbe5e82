import { hash, verify } from '@node-rs/argon2';

/** argon2id with the smallest settings that OWASP's password storage cheat sheet gives (from memory). */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

let standIn: Promise<string> | undefined;

/** An unknown person (null) costs as much work as a known one, so that timing names nobody. */
export async function passwordMatches(passwordHash: string | null, password: string) {
  standIn ??= hashPassword('nobody has this password');
  const matches = await verify(passwordHash ?? (await standIn), password);
  return passwordHash !== null && matches;
}
