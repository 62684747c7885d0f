import { createHash } from 'node:crypto';

/** Bytes that look random and are the same at every filling of the sample shop. */
export function steadyRandom(seed: string): (bytes: number) => Buffer {
  let count = 0;
  return (bytes) => {
    count += 1;
    const block = createHash('sha512').update(`${seed}|${count}`).digest();
    return Buffer.from(block.subarray(0, bytes));
  };
}
