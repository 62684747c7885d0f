import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65_535).default(0);
const blankIsAbsent = (value: unknown) => (value === '' ? undefined : value);
const optional = z.preprocess(blankIsAbsent, z.string().optional());

const schema = z.object({
  MOCKS_HOST: z.enum(['127.0.0.1', 'localhost', '::1']).default('127.0.0.1'),
  STRIPE_MOCK_PORT: port,
  STRIPE_MOCK_SECRET_KEY: z.string().regex(/^sk_test_\w{4,}$/, 'must be a test key: sk_test_ and at least four letters or digits'),
  STRIPE_MOCK_PUBLIC_URL: z.preprocess(blankIsAbsent, z.url().optional()),
  STRIPE_WEBHOOK_URL: z.preprocess(blankIsAbsent, z.url().optional()),
  STRIPE_WEBHOOK_SECRET: optional,
  MAILBOX_SMTP_PORT: port,
  MAILBOX_HTTP_PORT: port,
  MOCKS_STATE_DIR: optional,
});

export type MocksConfig = z.output<typeof schema>;

/** The environment as one typed object, or a sentence that says what is missing. */
export function mocksConfig(environment: Record<string, string | undefined>): MocksConfig {
  const result = schema.safeParse(environment);
  if (result.success) return result.data;
  throw new Error(`The mocks cannot start with these settings:\n${z.prettifyError(result.error)}`);
}
