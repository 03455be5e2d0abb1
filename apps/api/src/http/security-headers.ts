import type { RequestHandler } from 'express'
import helmet from 'helmet'

const OWN = ["'self'"]

/** The policy under which the client runs, in the demonstration as on a server. */
export const securityHeaders = (behindTls: boolean): RequestHandler[] => [
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: OWN,
        scriptSrc: OWN,
        scriptSrcAttr: ["'none'"],
        styleSrc: OWN,
        imgSrc: [...OWN, 'data:', 'blob:'],
        fontSrc: OWN,
        connectSrc: OWN,
        workerSrc: OWN,
        manifestSrc: OWN,
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        formAction: OWN,
        ...(behindTls ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    crossOriginResourcePolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    strictTransportSecurity: behindTls ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    xFrameOptions: { action: 'deny' },
  }),
  (_req, res, next) => {
    res.set('Permissions-Policy', 'camera=(), geolocation=(), microphone=()')
    next()
  },
]
