export const themes = ['system', 'day', 'dusk'] as const;
export type Theme = (typeof themes)[number];

const yearSeconds = 31_536_000;

/** What `<html data-theme>` should hold: nothing when the system decides. */
export function themeAttribute(theme: Theme): 'day' | 'dusk' | undefined {
  return theme === 'system' ? undefined : theme;
}

/**
 * The choice as `document.cookie` takes it. A cookie, so that the server's page has it already
 * and nothing flashes.
 */
export function themeCookieText(theme: Theme, secure: boolean): string {
  const end = secure ? '; Secure' : '';
  return `theme=${theme}; Path=/; Max-Age=${yearSeconds}; SameSite=Lax${end}`;
}
