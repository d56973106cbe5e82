import { AppError } from '@/lib/errors';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';

const QUARTER_HOUR_S = 15 * 60;

/** Per address and client, per client, and per address from everywhere: guessing is slow, locking out hard. */
const signInLimits = [
  { limiter: memory('sign-in', 8), key: (email: string, client: string) => `${email} ${client}` },
  { limiter: memory('sign-in-client', 60), key: (_: string, client: string) => client },
  { limiter: memory('sign-in-email', 60), key: (email: string) => email },
];
const signUpLimit = memory('sign-up', 60);

/** Counts an attempt to sign in before it is judged. */
export async function countSignIn(email: string, clientKey: string): Promise<void> {
  for (const { limiter, key } of signInLimits) await consume(limiter, key(email, clientKey));
}

/** A right password clears what its address and client had used up. */
export async function forgetSignIns(email: string, clientKey: string): Promise<void> {
  for (const { limiter, key } of signInLimits) await limiter.delete(key(email, clientKey));
}

export function countSignUp(clientKey: string): Promise<void> {
  return consume(signUpLimit, clientKey);
}

function memory(keyPrefix: string, points: number): RateLimiterMemory {
  return new RateLimiterMemory({ keyPrefix, points, duration: QUARTER_HOUR_S });
}

async function consume(limiter: RateLimiterMemory, key: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal;
    const minutes = Math.ceil(refusal.msBeforeNext / 60_000);
    const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
    throw new AppError('too_many', `Too many attempts. Try again in ${wait}.`);
  }
}
