import { argon2id, hash, verify } from 'argon2';

// OWASP Password Storage Cheat Sheet, minimum for argon2id: 19 MiB, 2 passes, 1 lane.
const costs = { type: argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** The hash with its salt and costs, as one text. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, costs);
}

let hashOfNothing: Promise<string> | undefined;

/** Whether the password is the one that was hashed. Without a hash it takes as long, and is never right. */
export async function isPassword(password: string, hashed: string | undefined): Promise<boolean> {
  hashOfNothing ??= hashPassword('no person has this name');
  const isRight = await verify(hashed ?? (await hashOfNothing), password);
  return isRight && hashed !== undefined;
}
