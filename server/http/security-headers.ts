import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * The policy that the page runs under. No code is made from strings; WebAssembly is allowed for the picture's kernel.
 * Component styles are inserted as elements, which is why inline styles have to be allowed.
 */
const CONTENT_POLICY = {
  defaultSrc: ["'self'"],
  scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
  scriptSrcAttr: ["'none'"],
  styleSrc: ["'self'", "'unsafe-inline'"],
  imgSrc: ["'self'", 'data:', 'blob:'],
  fontSrc: ["'self'"],
  connectSrc: ["'self'"],
  workerSrc: ["'self'"],
  objectSrc: ["'none'"],
  baseUri: ["'self'"],
  frameAncestors: ["'none'"],
  formAction: ["'self'"],
};

/** The headers that tell a browser what this site never does. `isSecure`: people reach it by HTTPS. */
export function securityHeaders(isSecure: boolean): RequestHandler {
  return helmet({
    // The defaults would send plain HTTP on a local network to HTTPS, where nobody answers.
    contentSecurityPolicy: { useDefaults: false, directives: CONTENT_POLICY },
    strictTransportSecurity: isSecure ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  });
}
