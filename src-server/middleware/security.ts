import helmet from 'helmet'

/** Headers that keep the page to itself. `isHttps`: whether people reach the server by https. */
export function securityHeaders(isHttps: boolean) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        // The planner and the solver are WebAssembly.
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        workerSrc: ["'self'", 'blob:'],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        frameSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        upgradeInsecureRequests: null,
      },
    },
    strictTransportSecurity: isHttps,
    // Browsers heed these only on https or loopback, and warn elsewhere.
    crossOriginOpenerPolicy: isHttps,
    originAgentCluster: isHttps,
    referrerPolicy: { policy: 'same-origin' },
  })
}
