import { useSyncExternalStore } from 'react';
import { type Theme, themeAttribute, themeCookieText, themes } from './theme';

const names: Record<Theme, string> = { system: 'System', day: 'Day', dusk: 'Dusk' };

/** Day, dusk, or as the system has it. The choice is a cookie and the root's `data-theme`. */
export function ThemeSwitch() {
  const theme = useSyncExternalStore(watchRoot, readRoot, () => undefined);
  return (
    <fieldset className="theme-switch">
      <legend className="only-heard">Colours</legend>
      {themes.map((each) => (
        <button
          key={each}
          type="button"
          aria-pressed={theme === each}
          onClick={() => chooseTheme(each)}
        >
          {names[each]}
        </button>
      ))}
    </fieldset>
  );
}

function chooseTheme(theme: Theme): void {
  const root = document.documentElement;
  const attribute = themeAttribute(theme);
  if (attribute) root.dataset.theme = attribute;
  else delete root.dataset.theme;
  // The Cookie Store API is missing from phones that are a few years old.
  Reflect.set(document, 'cookie', themeCookieText(theme, location.protocol === 'https:'));
}

function readRoot(): Theme {
  const value = document.documentElement.dataset.theme;
  return value === 'day' || value === 'dusk' ? value : 'system';
}

function watchRoot(changed: () => void): () => void {
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] });
  return () => observer.disconnect();
}
