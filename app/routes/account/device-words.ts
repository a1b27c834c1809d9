/** Parts that browsers carry to pass for an older one; they say nothing about what it is. */
const compatibility = new Set(['Mozilla', 'AppleWebKit', 'Gecko', 'Version', 'Mobile', 'Safari']);

/**
 * What a browser calls itself, short: `Firefox · Android 14`. It goes by the order of the parts
 * alone (product and comment, RFC 9110, 10.1.5) and knows no list of names.
 */
export function deviceWords(userAgent: string): string {
  const products = [...userAgent.matchAll(/([\w.]+)\/[\w.]+/g)].map((match) => match[1] ?? '');
  const own = products.filter((name) => !compatibility.has(name)).at(-1) ?? products.at(-1);
  const system = systemOf(/\(([^)]*)\)/.exec(userAgent)?.[1] ?? '');
  return [own, system].filter(Boolean).join(' · ') || 'A browser that does not say its name';
}

function systemOf(comment: string): string {
  const parts = comment.split(';').map((part) => part.trim());
  const android = parts.find((part) => part.startsWith('Android'));
  const [first = '', second = ''] = parts;
  return android ?? (first === 'X11' ? second : first);
}

/** How long ago, in words: the browser's own clock and zone don't matter. */
export function agoWords(from: Date, now: Date): string {
  const minutes = Math.max(0, Math.floor((now.getTime() - from.getTime()) / 60_000));
  if (minutes < 10) return 'just now';
  if (minutes < 60) return `${minutes} minutes ago`;
  const hours = Math.floor(minutes / 60);
  if (hours < 24) return hours === 1 ? '1 hour ago' : `${hours} hours ago`;
  const days = Math.floor(hours / 24);
  return days === 1 ? '1 day ago' : `${days} days ago`;
}
