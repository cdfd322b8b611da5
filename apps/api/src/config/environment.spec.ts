import { readEnvironment } from './environment.js';

const good = {
  BASE_URL: 'http://127.0.0.1:4600',
  DB_NAME: 'windchest',
  DB_USER: 'windchest',
  DB_PASSWORD: 'x',
  SESSION_SECRET: 's'.repeat(32),
  LINK_SECRET: 'l'.repeat(32),
  FILES_DIR: '/tmp/files',
  SMTP_URL: 'smtp://127.0.0.1:1025',
  MAIL_FROM: 'Workshop <bench@saltmarsh.example>',
  STRIPE_KEY: 'sk_test_local',
  STRIPE_WEBHOOK_SECRET: 'whsec_local',
};

describe('reading the settings', () => {
  it('gives one frozen object with defaults', () => {
    const environment = readEnvironment(good);
    expect(environment.CHECKOUT_MINUTES).toBe(30);
    expect(Object.isFrozen(environment)).toBe(true);
  });

  it('names every bad variable at once and prints no value', () => {
    const attempt = () =>
      readEnvironment({ ...good, BASE_URL: 'not-a-url-xyz', SESSION_SECRET: 'hunter2', DB_NAME: undefined });
    expect(attempt).toThrow(/BASE_URL[\s\S]*DB_NAME|DB_NAME[\s\S]*BASE_URL/);
    expect(attempt).toThrow(/SESSION_SECRET: at least 32 characters/);
    expect(attempt).not.toThrow(/hunter2|not-a-url-xyz/);
  });
});
