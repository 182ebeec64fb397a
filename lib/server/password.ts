import 'server-only';
import { hash, verify } from '@node-rs/argon2';
import { dictionary } from '@zxcvbn-ts/language-common';
import { SHORTEST_PASSWORD } from '@/lib/accounts/domain/password-rules';

/** argon2id (the library's own choice of kind) with 19 MiB, two rounds, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Two cores: more at once would keep readers waiting and gain nothing. */
const AT_ONCE = 2;

/** How many of the most common passwords are refused, of those long enough to be asked about. */
const COMMON = 3000;

declare global {
  var footringHashing: { running: number; readonly waiting: (() => void)[] } | undefined;
}

// On the global object: pages and route handlers each load their own copy of this module, and share the cores.
const queue = (globalThis.footringHashing ??= { running: 0, waiting: [] });

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (queue.running >= AT_ONCE) await new Promise<void>((resolve) => queue.waiting.push(resolve));
  else queue.running += 1;
  try {
    return await work();
  } finally {
    const next = queue.waiting.shift(); // whoever comes next takes the place over
    if (next === undefined) queue.running -= 1;
    else next();
  }
}

/** The hash to keep, with its parameters in it. */
export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(password, COST));

// Of a password nobody knows, made by the same parameters: who has no account waits as long as who has.
let decoy: Promise<string> | undefined;

/** Whether that is the password. Without a hash it never is, and takes as long. */
export async function isPassword(kept: string | null, password: string): Promise<boolean> {
  const known = kept ?? (await (decoy ??= hashPassword(crypto.randomUUID())));
  const fits = await inTurn(() => verify(known, password));
  return kept !== null && fits;
}

let common: ReadonlySet<string> | undefined;

/**
 * The passwords that most people use, in lower case: the first of the list `passwords-common` of @zxcvbn-ts/language-common, which
 * stands in the order of use in leaked collections. Read on the server only.
 */
export function commonPasswords(): ReadonlySet<string> {
  common ??= new Set(dictionary['passwords-common'].filter((word) => word.length >= SHORTEST_PASSWORD).slice(0, COMMON));
  return common;
}
