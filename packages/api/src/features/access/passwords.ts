import argon2 from 'argon2';

/** OWASP's first recommended Argon2id setting: 19 MiB, 2 passes, 1 lane (from memory). Tests use a cheap one. */
let cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function useCheapHashes(): void {
  cost = { memoryCost: 1024, timeCost: 1, parallelism: 1 };
}

export function hashPassword(password: string): Promise<string> {
  return argon2.hash(password, { type: argon2.argon2id, ...cost });
}

/** Compares in the same time whether the login exists or not, so that addresses can't be guessed. */
export async function isPassword(hash: string | null | undefined, password: string): Promise<boolean> {
  if (!hash) {
    await hashPassword(password);
    return false;
  }
  return argon2.verify(hash, password);
}
