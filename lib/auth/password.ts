import { hash, verify } from "@node-rs/argon2";

/* argon2id, the library's default; 19 MiB, 2 passes, 1 lane: OWASP Password Storage Cheat Sheet (from memory). */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, COST);
}

/** Whether a password is the hashed one. A damaged hash is a no. */
export async function isPassword(passwordHash: string, password: string): Promise<boolean> {
  try {
    return await verify(passwordHash, password);
  } catch {
    return false;
  }
}
