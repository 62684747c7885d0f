import { describe, expect, it } from 'vitest';
import { ConfigError, DEMO_JWT_SECRET, readConfig } from './config.js';

const REAL = {
  PUBLIC_URL: 'https://shop.example/',
  DATA_DIR: 'data',
  JWT_SECRET: 'a secret of the shop’s own, long enough',
  SMTP_URL: 'smtp://mail.example:587',
  MAIL_FROM: 'Shop <shop@shop.example>',
  STRIPE_SECRET_KEY: 'sk_live_abc',
  STRIPE_WEBHOOK_SECRET: 'whsec_abc',
};
const DEMO = { ...REAL, DEMO: 'on', JWT_SECRET: DEMO_JWT_SECRET, STRIPE_SECRET_KEY: 'sk_test_demo', STRIPE_WEBHOOK_SECRET: 'whsec_demo_loopbay', STRIPE_API_URL: 'http://127.0.0.1:3010' };
const refusal = (env: Record<string, string | undefined>): string => {
  try {
    readConfig(env);
    return '';
  } catch (error) {
    expect(error).toBeInstanceOf(ConfigError);
    return (error as Error).message;
  }
};

describe('the settings of a shop', () => {
  it('are taken when they are complete', () => {
    expect(readConfig(REAL)).toMatchObject({ demo: false, publicUrl: 'https://shop.example', port: 3000, host: '127.0.0.1', timeZone: 'Europe/Berlin' });
    expect(readConfig(DEMO).demo).toBe(true);
  });

  it.each(Object.keys(REAL))('are refused without %s, which is named', (name) => {
    expect(refusal({ ...REAL, [name]: undefined })).toContain(name);
  });

  it('everything that is missing is said in one message', () => {
    const message = refusal({});
    for (const name of Object.keys(REAL)) expect(message).toContain(name);
  });

  it('a value that is wrong is never printed', () => {
    expect(refusal({ ...REAL, JWT_SECRET: 'short and secret' })).not.toContain('short and secret');
    expect(refusal({ ...REAL, STRIPE_SECRET_KEY: 'pk_something' })).not.toContain('pk_something');
  });

  it('the demo’s secrets do not open a real shop', () => {
    expect(refusal({ ...REAL, JWT_SECRET: DEMO_JWT_SECRET })).toContain('JWT_SECRET');
    expect(refusal({ ...REAL, STRIPE_WEBHOOK_SECRET: 'whsec_demo_loopbay' })).toContain('STRIPE_WEBHOOK_SECRET');
  });

  it('a live key never goes to a fake, and the demo never to the real payment service', () => {
    expect(refusal({ ...REAL, STRIPE_API_URL: 'http://127.0.0.1:3010' })).toContain('live key');
    expect(refusal({ ...DEMO, STRIPE_SECRET_KEY: 'sk_live_abc' })).toContain('live key');
    expect(refusal({ ...DEMO, STRIPE_API_URL: undefined })).toContain('on this machine');
    expect(refusal({ ...DEMO, STRIPE_API_URL: 'https://pay.example' })).toContain('on this machine');
  });

  it('a time zone that does not exist is refused', () => {
    expect(refusal({ ...REAL, SHOP_TIME_ZONE: 'Mars/Olympus' })).toContain('SHOP_TIME_ZONE');
  });
});
