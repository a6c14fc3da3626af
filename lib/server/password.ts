/** Passwords: argon2id, never kept or logged in clear. */
import "server-only";
import { hash, verify } from "@node-rs/argon2";

/** The package's default algorithm is argon2id. OWASP password storage cheat sheet (common practice, no source): 19 MiB, 2 passes, 1 lane. */
const options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string): Promise<string> => hash(password, options);

let spare: Promise<string> | undefined;

/** Checks a password; without a hash it spends the same time, so an unknown address answers no faster than a known one. */
export async function checkPassword(passwordHash: string | undefined, password: string): Promise<boolean> {
  spare ??= hashPassword(crypto.randomUUID());
  const matches = await verify(passwordHash ?? (await spare), password);
  return matches && passwordHash !== undefined;
}
