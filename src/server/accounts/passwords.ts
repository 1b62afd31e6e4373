/** Password hashing: argon2id with OWASP's parameters (Password Storage Cheat Sheet: 19 MiB, 2 passes, 1 lane). */
import argon2 from 'argon2';

const OPTIONS = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

// Hashing occupies libuv's few threads; more than two at once would stall everything else.
const MOST_AT_ONCE = 2;
let running = 0;
const waiting: (() => void)[] = [];

async function oneOfFew<T>(work: () => Promise<T>): Promise<T> {
  if (running >= MOST_AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve));
  running++;
  try {
    return await work();
  } finally {
    running--;
    waiting.shift()?.();
  }
}

export const hashPassword = (password: string): Promise<string> =>
  oneOfFew(() => argon2.hash(password.normalize('NFC'), OPTIONS));

let unknownPersonsHash: Promise<string> | null = null;

/** Compares with a stored hash; for unknown people with a hash of nothing, so that both take the same time. */
export async function passwordFits(stored: string | null, password: string): Promise<boolean> {
  unknownPersonsHash ??= hashPassword(crypto.randomUUID());
  const hash = stored ?? (await unknownPersonsHash);
  const fits = await oneOfFew(() => argon2.verify(hash, password.normalize('NFC')));
  return fits && stored !== null;
}

export const needsRehash = (stored: string): boolean => argon2.needsRehash(stored, OPTIONS);
