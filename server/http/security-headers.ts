import type { RequestHandler } from 'express'
import helmet from 'helmet'

const nowhere = ['accelerometer', 'autoplay', 'browsing-topics', 'display-capture', 'geolocation', 'gyroscope', 'hid', 'magnetometer', 'microphone', 'midi', 'payment', 'screen-wake-lock', 'serial', 'usb', 'xr-spatial-tracking']
const permissions = [...nowhere.map((feature) => `${feature}=()`), 'camera=(self)', 'fullscreen=(self)'].join(', ')

/** What browsers are told about every answer: only our own scripts, styles and pictures, framed by nobody, plain http never again. */
export function securityHeaders(isHttps: boolean): RequestHandler[] {
  return [
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"], scriptSrc: ["'self'"], styleSrc: ["'self'"], imgSrc: ["'self'", 'data:', 'blob:'], fontSrc: ["'self'"], connectSrc: ["'self'"],
          workerSrc: ["'self'"], frameAncestors: ["'none'"], formAction: ["'self'"], objectSrc: ["'none'"], baseUri: ["'none'"],
        },
      },
      strictTransportSecurity: isHttps ? { maxAge: 365 * 24 * 3600, includeSubDomains: false } : false,
      // A link's token stands in the address of its page, so no other site may learn addresses.
      referrerPolicy: { policy: 'same-origin' },
      xFrameOptions: { action: 'deny' },
    }),
    (_req, res, next) => {
      res.set('Permissions-Policy', permissions)
      next()
    },
  ]
}
