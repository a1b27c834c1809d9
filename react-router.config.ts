import type { Config } from '@react-router/dev/config';

export default {
  ssr: true,
  // A test run builds beside the build that a running start serves.
  buildDirectory: process.env.VALVESIDE_BUILD_DIR || 'build',
  // Lazy route discovery asks the server for routes and so fails without signal.
  routeDiscovery: { mode: 'initial' },
  // The framework compares Origin with the address that the server sees, which is another one behind
  // a TLS proxy. `same-origin.server.ts` goes by the public address instead, for every route.
  allowedActionOrigins: ['**'],
  future: {
    v8_middleware: true,
    v8_splitRouteModules: true,
    v8_viteEnvironmentApi: true,
    v8_trailingSlashAwareDataRequests: true,
    v8_passThroughRequests: true,
  },
} satisfies Config;
