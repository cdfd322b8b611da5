import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** The tuner listens by the shop's own pages; nothing else of a visitor's machine is ever asked for. */
const PERMISSIONS = 'microphone=(self), camera=(), geolocation=(), payment=(), usb=()';

/** Everything from ourselves, nothing inline: no third party is ever asked for anything. */
export const securityHeaders = (baseUrl: string): RequestHandler => {
  const headers = contentHeaders(baseUrl);
  return (request, response, next) => {
    response.setHeader('Permissions-Policy', PERMISSIONS);
    headers(request, response, next);
  };
};

const contentHeaders = (baseUrl: string): RequestHandler =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        // Uploads are hashed by a WebAssembly module of our own; scripts made of text stay refused.
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        styleSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        mediaSrc: ["'self'", 'blob:'],
        workerSrc: ["'self'", 'blob:'],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        baseUri: ["'none'"],
        objectSrc: ["'none'"],
      },
    },
    crossOriginEmbedderPolicy: false,
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    strictTransportSecurity: baseUrl.startsWith('https:')
      ? { maxAge: 31_536_000, includeSubDomains: true }
      : false,
  });
