import { hash, verify } from '@node-rs/argon2';

/** argon2id at the parameters OWASP names first: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 };
let decoy: Promise<string> | undefined;

export const hashPassword = (password: string) => hash(password, COST);

export function passwordMatches(passwordHash: string, password: string): Promise<boolean> {
  return verify(passwordHash, password).catch(() => false);
}

/** Takes as long as a real check, so that an unknown name answers no faster than a wrong password. */
export async function decoyCheck(password: string): Promise<false> {
  decoy ??= hashPassword('nobody has this password');
  await passwordMatches(await decoy, password);
  return false;
}
