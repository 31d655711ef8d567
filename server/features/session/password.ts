import { hash, verify } from '@node-rs/argon2';
import { busy, invalidField } from '#server/problem.ts';

/** argon2id (the package's default kind), OWASP's first choice of parameters. */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Hashing is slow on purpose: four at once, twenty waiting, then "busy" rather than everybody late. */
const AT_ONCE = 4;
const WAITING = 20;
let running = 0;
const queue: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_ONCE) {
    if (queue.length >= WAITING) throw busy('Too many sign-ins at once');
    await new Promise<void>((resolve) => queue.push(resolve));
  }
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    queue.shift()?.();
  }
}

/** PHC string of an argon2id hash. */
export function hashPassword(password: string): Promise<string> {
  return inTurn(() => hash(password, PARAMETERS));
}

/** Of no password; spent on unknown addresses so that they take as long as known ones. */
let dummyHash: Promise<string> | undefined;

/** Whether the password fits; without a hash it takes just as long and says no. */
export async function passwordFits(storedHash: string | undefined, password: string): Promise<boolean> {
  dummyHash ??= hash('no password is this one', PARAMETERS);
  const against = storedHash ?? (await dummyHash);
  const fits = await inTurn(() => verify(against, password));
  return fits && storedHash !== undefined;
}

/** Common ones of twelve characters and more; shorter ones are refused by length. */
const COMMON = new Set(['123456789012', '1234567890123', 'password1234', 'passwordpassword', 'qwertyuiop12', 'qwertyuiopas', 'iloveyou1234', 'administrator', 'letmeinletmein', 'welcome12345', 'abcdefghijkl', '111111111111', '000000000000', 'changemechangeme', 'football1234', 'sunshine1234', 'princess1234', 'soapsoapsoap']);

/** @throws Problem 422 for a password that others would try first */
export function refuseWeakPassword(password: string, ownWords: readonly string[]): void {
  const plain = password.toLowerCase();
  const isOwn = ownWords.some((word) => word.length >= 4 && plain.replaceAll(word.toLowerCase(), '').length < 6);
  if (COMMON.has(plain) || new Set(plain).size < 4 || isOwn) {
    throw invalidField('#/password', 'This password is among the first that others would try; choose another, for example four unrelated words');
  }
}
