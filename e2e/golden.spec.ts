import { createHash } from 'node:crypto';
import { expect, test } from '@playwright/test';
import { build } from 'vite';
import { GOLDEN_SHA256 } from '../app/air/golden-hash';

/** The engine as one script, with nothing of the app around it. */
async function bundleEngine(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'silent',
    build: {
      write: false,
      minify: false,
      lib: { entry: 'app/air/golden.ts', formats: ['iife'], name: 'engine', fileName: 'engine' },
    },
  });
  const [first] = Array.isArray(built) ? built : [built];
  if (!first || !('output' in first)) throw new Error('the engine was not bundled');
  return first.output[0].code;
}

test('the golden log gives in Chromium the bytes that are committed from Node', async ({
  page,
}) => {
  const code = await bundleEngine();
  await page.goto('about:blank');
  const inBrowser = await page.evaluate((script) => {
    const run = new Function(`${script}; return engine.goldenAdvice();`);
    return run() as string;
  }, code);
  const hash = createHash('sha256').update(inBrowser).digest('hex');
  expect(inBrowser.length).toBeGreaterThan(1000);
  expect(hash).toBe(GOLDEN_SHA256);
});
