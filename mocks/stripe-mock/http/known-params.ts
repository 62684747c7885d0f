import type { z } from 'zod';

/** Only parameters that the SDK in use has; one that an API version drops no longer compiles here. */
export type KnownParams<P> = Partial<Record<keyof P, z.ZodType>>;
