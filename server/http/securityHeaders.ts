import type { RequestHandler } from "express";
import helmet from "helmet";

const own = ["'self'"];

/**
 * Only this server's own scripts, fonts and workers; the microphone only for its own pages. Sound may come from the storage
 * of recordings besides, by links that it signed.
 */
export function securityHeaders(secure: boolean, soundOrigin: string): RequestHandler[] {
  return [
    helmet({
      contentSecurityPolicy: {
        // The defaults would upgrade every request to TLS, which plain http on loopback does not have.
        useDefaults: false,
        directives: {
          defaultSrc: own,
          scriptSrc: own,
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", "data:", "blob:"],
          mediaSrc: ["'self'", "blob:", soundOrigin],
          connectSrc: ["'self'", "blob:"],
          workerSrc: own,
          fontSrc: own,
          objectSrc: ["'none'"],
          baseUri: ["'none'"],
          formAction: own,
          frameAncestors: ["'none'"],
        },
      },
      referrerPolicy: { policy: "same-origin" },
      strictTransportSecurity: secure ? { maxAge: 31_536_000 } : false,
    }),
    (_req, res, next) => {
      res.set("Permissions-Policy", "microphone=(self)");
      next();
    },
  ];
}
