import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

const SELF = "'self'";
const NONE = "'none'";

/**
 * Nothing from anywhere else, nothing inline but what carries this reply's nonce. Everything the client
 * needs (fonts, icons, its web worker) comes from the same origin.
 */
export function secureHeaders(options: { readonly overTls: boolean }): RequestHandler[] {
  const giveNonce: RequestHandler = (_request, response, next) => {
    response.locals['nonce'] = randomBytes(18).toString('base64');
    response.setHeader('Permissions-Policy', 'camera=(), geolocation=(), microphone=()');
    next();
  };
  const headers = helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: [SELF],
        scriptSrc: [SELF],
        styleSrc: [SELF, (_request, response) => `'nonce-${nonceOf(response as Response)}'`],
        imgSrc: [SELF, 'data:'],
        fontSrc: [SELF],
        connectSrc: [SELF],
        workerSrc: [SELF],
        baseUri: [SELF],
        formAction: [SELF],
        objectSrc: [NONE],
        frameAncestors: [NONE],
      },
    },
    // Over plain HTTP on this machine the header would be ignored at best.
    strictTransportSecurity: options.overTls,
    xFrameOptions: { action: 'deny' },
  });
  return [giveNonce, headers];
}

export function nonceOf(response: Response): string {
  return String(response.locals['nonce']);
}
