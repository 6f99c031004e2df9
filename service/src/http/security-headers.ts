import { randomBytes } from 'node:crypto';
import type { NextFunction, Request, RequestHandler, Response } from 'express';
import helmet from 'helmet';

const nonces = new WeakMap<Response, string>();

/** The nonce of this answer; only style elements that carry it are applied. */
export function styleNonceOf(response: Response): string {
  const nonce = nonces.get(response) ?? randomBytes(16).toString('base64');
  nonces.set(response, nonce);
  return nonce;
}

/**
 * Nothing foreign is loaded, nothing inline is run. Style elements that the component library writes carry a nonce;
 * style attributes are let through (see reference/decisions: style attributes and the content security policy).
 */
export function securityHeaders(publicUrl: string): RequestHandler {
  const https = publicUrl.startsWith('https:');
  const secure = helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", (_request, response) => `'nonce-${styleNonceOf(response as Response)}'`],
        styleSrcAttr: ["'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'"],
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'same-origin' },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  });
  return (request: Request, response: Response, next: NextFunction) => {
    response.removeHeader('X-Powered-By');
    // Answers of the interface are one person's; what may be kept says so itself.
    if (request.path.startsWith('/api/')) response.set('Cache-Control', 'no-store');
    secure(request, response, next);
  };
}
