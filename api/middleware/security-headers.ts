import type { RequestHandler } from 'express';
import helmet from 'helmet';

const pagePolicy = {
  defaultSrc: ["'self'"],
  scriptSrc: ["'self'"],
  scriptSrcAttr: ["'none'"],
  // Attributes alone: the drawings and the map place things by style="…".
  styleSrc: ["'self'"],
  styleSrcAttr: ["'unsafe-inline'"],
  imgSrc: ["'self'", 'data:', 'blob:'],
  fontSrc: ["'self'"],
  connectSrc: ["'self'"],
  workerSrc: ["'self'", 'blob:'],
  objectSrc: ["'none'"],
  baseUri: ["'none'"],
  formAction: ["'self'"],
  frameAncestors: ["'none'"],
};

/** The strict policy of every answer; https headers only where people come by https. */
export function securityHeaders(publicUrl: string): RequestHandler {
  const isHttps = publicUrl.startsWith('https:');
  return helmet({
    contentSecurityPolicy: { useDefaults: false, directives: pagePolicy },
    strictTransportSecurity: isHttps,
    crossOriginOpenerPolicy: isHttps,
    originAgentCluster: isHttps,
    referrerPolicy: { policy: 'same-origin' },
  });
}

/**
 * The policy of the worker that unites shadows, on its own script alone: the glue of its
 * WebAssembly evaluates strings. A worker takes the policy of its own response.
 */
export const shadowWorkerPolicy =
  "default-src 'none'; script-src 'self' 'unsafe-eval'; connect-src 'self'";
