import type { RequestHandler } from 'express';
import helmet from 'helmet';
import type { Settings } from '../config/settings';

/**
 * The page may load from this address only, and run no text as code: neither inline scripts nor eval.
 *
 * Inline styles are allowed because both libraries that draw need them, as measured in Chromium with them forbidden:
 * Fluent's Griffel makes <style> elements and fills them by rule, and loses every style; Plotly adds <style> elements
 * and style attributes, which no nonce can name. A style cannot run code, and nothing that a user types is put into one.
 */
export function securityHeaders({ secureCookies }: Pick<Settings, 'secureCookies'>): RequestHandler {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        scriptSrc: ["'self'"],
        workerSrc: ["'self'"],
        connectSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        fontSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        manifestSrc: ["'self'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        objectSrc: ["'none'"],
      },
    },
    // Only where there is TLS: on plain loopback it would lock the address for other programs.
    strictTransportSecurity: secureCookies,
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'no-referrer' },
    xFrameOptions: { action: 'deny' },
  });
}

/** Answers of the API are somebody's own: no cache keeps them. A route may set its own header afterwards. */
export const noStore: RequestHandler = (_, response, next) => {
  response.setHeader('Cache-Control', 'no-store');
  next();
};
