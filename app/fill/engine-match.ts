import { ENGINE_VERSION } from '~/air';

type Page = Pick<Window, 'sessionStorage' | 'location'>;

const key = 'valveside.reloaded-for-engine';

/**
 * Loads a page anew whose engine is another one than the server's, so that both sides of the coach
 * get the same advice. Once for each version: where that doesn't help, as during a deployment, the
 * page advises by its own engine rather than never.
 * @returns true when the page is going, and should do nothing more
 */
export function reloadForEngine(serversVersion: string, page: Page): boolean {
  if (serversVersion === ENGINE_VERSION) return false;
  try {
    if (page.sessionStorage.getItem(key) === serversVersion) return false;
    page.sessionStorage.setItem(key, serversVersion);
  } catch {
    // Nothing may be kept here, so nothing would stop a second reload.
    return false;
  }
  page.location.reload();
  return true;
}
