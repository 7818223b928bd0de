import argon2 from 'argon2';

/** OWASP's least for Argon2id: 19 MiB, two passes, one lane. A hash carries its own figures. */
const cost = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Each hash holds 19 MiB; more at once would let a crowd at the door fill the memory. */
const atOnce = 4;
let running = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= atOnce) await new Promise<void>((resolve) => waiting.push(resolve));
  else running++;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running--;
  }
}

export const hashPassword = (password: string): Promise<string> => inTurn(() => argon2.hash(password, cost));

export const isWeaker = (hash: string): boolean => argon2.needsRehash(hash, cost);

let dummy: Promise<string> | undefined;

/** Takes the same time whether there is a password to compare with or not. */
export async function verifyPassword(hash: string | null, password: string): Promise<boolean> {
  dummy ??= hashPassword('nobody has this password');
  const against = hash ?? (await dummy);
  const fits = await inTurn(() => argon2.verify(against, password));
  return fits && hash !== null;
}
