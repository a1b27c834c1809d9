/** Stands for this site while an address is read; never asked for anything. */
const here = 'http://here.invalid';

/**
 * `path` when it leads to a page of this site, else `otherwise`: a link to sign-in must not be able
 * to send people elsewhere. Browsers read `//x`, `/\x` and tabs in between as another host.
 */
export function localPath(path: string | null | undefined, otherwise: string): string {
  if (!path?.startsWith('/')) return otherwise;
  const url = URL.parse(path, here);
  if (url?.origin !== here) return otherwise;
  const clean = url.pathname + url.search + url.hash;
  return clean.startsWith('//') ? otherwise : clean;
}
