import { apiEnvironment, stripeEnvironment, visitorEnvironment } from './stand-environment.mjs';
import { PREFERRED_PORTS } from './ports.mjs';
import { makeSecrets } from './secrets.mjs';

const factsIn = (mode: 'start' | 'dev' | 'throwaway') => ({
  mode,
  folder: '/stand',
  ports: PREFERRED_PORTS,
  secrets: makeSecrets(),
  database: { host: '127.0.0.1', port: 4620, name: 'windchest', user: 'windchest', password: 'p' },
});

describe('what the servers of a stand are told', () => {
  it('has the API serve the pages, at one address', () => {
    const api = apiEnvironment(factsIn('start'));
    expect(api['BASE_URL']).toBe('http://127.0.0.1:4600');
    expect(api['PORT']).toBe('4600');
  });

  it('has Vite at the same address while developing, and sends webhooks past it', () => {
    const facts = factsIn('dev');
    const api = apiEnvironment(facts);
    expect(api['BASE_URL']).toBe('http://127.0.0.1:4600');
    expect(api['PORT']).toBe('4610');
    expect(stripeEnvironment(facts)['FAKE_STRIPE_WEBHOOK_URL']).toBe(
      'http://127.0.0.1:4610/api/payments/webhook',
    );
    expect(visitorEnvironment(facts)['WINDCHEST_URL']).toBe('http://127.0.0.1:4600');
  });

  it('gives the payment stand-in the keys the API uses', () => {
    const facts = factsIn('start');
    const stripe = stripeEnvironment(facts);
    const api = apiEnvironment(facts);
    expect(stripe['FAKE_STRIPE_KEY']).toBe(api['STRIPE_KEY']);
    expect(stripe['FAKE_STRIPE_WEBHOOK_SECRET']).toBe(api['STRIPE_WEBHOOK_SECRET']);
    expect(stripe['FAKE_STRIPE_KEY']).toMatch(/^sk_test_local/);
  });

  it('switches the rate limits off only where journeys of many people come from one address', () => {
    expect(apiEnvironment(factsIn('start'))).not.toHaveProperty('RATE_LIMITS_OFF');
    expect(apiEnvironment(factsIn('throwaway'))['RATE_LIMITS_OFF']).toBe('1');
  });
});
