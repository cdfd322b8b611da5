import type { Request, Response } from 'express';
import { securityHeaders } from './security-headers.js';

const headersFor = (baseUrl: string): Map<string, string> => {
  const headers = new Map<string, string>();
  const response = {
    setHeader: (name: string, value: string) => headers.set(name.toLowerCase(), value),
    removeHeader: () => undefined,
  };
  securityHeaders(baseUrl)({} as Request, response as unknown as Response, () => undefined);
  return headers;
};

describe('the headers of every answer', () => {
  it('let the shop’s own pages listen by the microphone, and nobody use a camera or a place', () => {
    const policy = headersFor('http://127.0.0.1').get('permissions-policy');
    expect(policy).toContain('microphone=(self)');
    expect(policy).toContain('camera=()');
    expect(policy).toContain('geolocation=()');
  });

  it('allow nothing inline and nothing from elsewhere', () => {
    const policy = headersFor('http://127.0.0.1').get('content-security-policy');
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("connect-src 'self'");
    expect(policy).not.toContain('unsafe-inline');
    expect(policy).not.toContain("'unsafe-eval'");
  });

  it('ask for encryption where the shop has it', () => {
    expect(headersFor('https://shop.example').get('strict-transport-security')).toMatch(/max-age=31536000/);
    expect(headersFor('http://127.0.0.1').has('strict-transport-security')).toBe(false);
  });
});
