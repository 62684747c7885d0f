import type { GateCondition } from '@shared/errors';

/** One condition of a gate: its words say what is so, or what is missing; the place is where it is put right. */
export const condition = (code: string, met: boolean, words: string, place: string | null): GateCondition => ({ code, met, words, place });
