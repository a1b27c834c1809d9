import { join } from 'node:path';
import type { Config } from '@react-router/dev/config';
import { build } from 'vite';

export default {
  ssr: true,
  // A test run builds beside the build that a running start serves.
  buildDirectory: process.env.VALVESIDE_BUILD_DIR || 'build',
  // Lazy route discovery asks the server for routes and so fails without signal.
  routeDiscovery: { mode: 'initial' },
  // The framework compares Origin with the address that the server sees, which is another one behind
  // a TLS proxy. `same-origin.server.ts` goes by the public address instead, for every route.
  allowedActionOrigins: ['**'],
  buildEnd: ({ reactRouterConfig }) => buildReplayWorker(reactRouterConfig.buildDirectory),
  future: {
    v8_middleware: true,
    v8_splitRouteModules: true,
    v8_viteEnvironmentApi: true,
    v8_trailingSlashAwareDataRequests: true,
    // `v8_passThroughRequests` stays off: with it a relative redirect goes to the data address.
  },
} satisfies Config;

/** The replay pool's thread is a program of its own, put beside the server's. */
async function buildReplayWorker(buildDirectory: string): Promise<void> {
  await build({
    configFile: false,
    logLevel: 'warn',
    resolve: { tsconfigPaths: true },
    build: {
      ssr: 'app/services/replay-worker.server.ts',
      outDir: join(buildDirectory, 'server'),
      emptyOutDir: false,
      copyPublicDir: false,
      rollupOptions: { output: { entryFileNames: 'replay-worker.js' } },
    },
  });
}
