import { existsSync } from 'node:fs';
import { installPackages } from './debian-packages';

export const CHROMIUM = '/usr/bin/chromium';

/** Debian's browser for the end-to-end tests; the font is for glyphs that ours does not have. */
export async function ensureChromium(): Promise<void> {
  if (existsSync(CHROMIUM)) return;
  await installPackages(
    ['chromium', 'fonts-dejavu-core'],
    'The end-to-end tests need Chromium, which is not on this machine',
  );
}
