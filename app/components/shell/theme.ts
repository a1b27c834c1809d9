export const themes = ['system', 'day', 'dusk'] as const;
export type Theme = (typeof themes)[number];

/** The cookie that keeps the choice: read by the server, so that no page flashes the other theme. */
export const themeCookie = 'theme';
const yearSeconds = 31_536_000;

/** Reads the choice from a Cookie header; anything unknown follows the system. */
export function themeFromCookie(header: string | null): Theme {
  const value = /(?:^|;\s*)theme=([a-z]+)/.exec(header ?? '')?.[1];
  return themes.find((theme) => theme === value) ?? 'system';
}

/** What `<html data-theme>` should hold: nothing when the system decides. */
export function themeAttribute(theme: Theme): 'day' | 'dusk' | undefined {
  return theme === 'system' ? undefined : theme;
}

/** The cookie as `document.cookie` takes it. */
export function themeCookieText(theme: Theme, secure: boolean): string {
  const end = secure ? '; Secure' : '';
  return `${themeCookie}=${theme}; Path=/; Max-Age=${yearSeconds}; SameSite=Lax${end}`;
}
