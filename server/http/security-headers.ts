import type { RequestHandler } from 'express'
import helmet from 'helmet'

/**
 * Nothing but our own files runs, styles, loads or frames the page. Vue and Element Plus set
 * positions through the style object of an element, which the policy allows without
 * 'unsafe-inline'; drawings are saved as pictures through `blob:` and `data:`.
 */
export function securityHeaders(appUrl: string): RequestHandler {
  const isSecure = new URL(appUrl).protocol === 'https:'
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        workerSrc: ["'self'"],
        styleSrc: ["'self'"],
        connectSrc: ["'self'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: ["'self'"],
        // Only where the page itself is on https: on plain http it would break every file.
        upgradeInsecureRequests: isSecure ? [] : null,
      },
    },
    strictTransportSecurity: isSecure ? { maxAge: 31_536_000, includeSubDomains: false } : false,
    xFrameOptions: { action: 'deny' },
  })
}
