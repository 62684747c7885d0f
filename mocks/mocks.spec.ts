import { NestFactory } from '@nestjs/core';
import { afterEach, describe, expect, it } from 'vitest';
import { mocksConfig } from './mocks-config.js';
import { MocksModule, OutsideWorld } from './mocks.module.js';

describe('the outside world as one process', () => {
  const before = { ...process.env };
  afterEach(() => {
    process.env = { ...before };
  });

  it('opens the payment service, the mail server and the mailbox on free ports, and closes them', async () => {
    Object.assign(process.env, { STRIPE_MOCK_SECRET_KEY: 'sk_test_demo1234', STRIPE_MOCK_PORT: '0', MAILBOX_SMTP_PORT: '0', MAILBOX_HTTP_PORT: '0', MOCKS_STATE_DIR: '', STRIPE_WEBHOOK_URL: '' });
    const mocks = await NestFactory.createApplicationContext(MocksModule, { logger: false, abortOnError: false });
    const ports = mocks.get(OutsideWorld).ports();
    expect((await fetch(`http://127.0.0.1:${ports.stripe.port}/_control`)).status).toBe(200);
    expect((await fetch(`http://127.0.0.1:${ports.mailbox.port}/api/door`)).status).toBe(200);
    expect(new Set([ports.stripe.port, ports.smtp.port, ports.mailbox.port]).size).toBe(3);
    await mocks.close();
    await expect(fetch(`http://127.0.0.1:${ports.mailbox.port}/api/door`)).rejects.toThrow();
  });

  it('refuses a live key, an address beyond this machine and a port that is none, and says which', () => {
    expect(() => mocksConfig({})).toThrow('STRIPE_MOCK_SECRET_KEY');
    expect(() => mocksConfig({ STRIPE_MOCK_SECRET_KEY: `sk_${'live'}_abcdefgh` })).toThrow('STRIPE_MOCK_SECRET_KEY');
    expect(() => mocksConfig({ STRIPE_MOCK_SECRET_KEY: 'sk_test_demo1234', MOCKS_HOST: '0.0.0.0' })).toThrow('MOCKS_HOST');
    expect(() => mocksConfig({ STRIPE_MOCK_SECRET_KEY: 'sk_test_demo1234', STRIPE_MOCK_PORT: '70000' })).toThrow('STRIPE_MOCK_PORT');
  });
});
