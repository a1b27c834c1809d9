import type { ReactNode } from 'react';
import { Link, NavLink, useRouteLoaderData } from 'react-router';
import { Mark } from './mark';
import { ThemeSwitch } from './theme-switch';

export interface PageShellProps {
  /** A `<CoachNav>` below the head, on the pages of one coach. */
  nav?: ReactNode;
  /** Keeps running text to a readable measure. */
  narrow?: boolean;
  children: ReactNode;
}

interface RootData {
  viewer?: { email: string } | null;
}

/**
 * The frame of every page but the live screen: mark, ways on, content, foot. Who is signed in
 * comes from the root's loader, so a page has nothing to pass on.
 */
export function PageShell({ nav, narrow = false, children }: PageShellProps) {
  const viewer = useRouteLoaderData<RootData>('root')?.viewer;
  return (
    <>
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <header className="page-head">
        <Link className="mark" to="/">
          <Mark />
          {/* Signed in, a phone has no room for the name beside four ways on. */}
          <span className={viewer ? 'max-sm:sr-only' : undefined}>Valveside</span>
        </Link>
        <nav className="page-nav" aria-label="Main">
          {viewer && <NavLink to="/coaches">Coaches</NavLink>}
          <NavLink to="/practice">Practice</NavLink>
          <NavLink to="/help">Help</NavLink>
        </nav>
        <nav className="page-nav page-me" aria-label="Account">
          {viewer ? (
            <NavLink to="/account" title={viewer.email}>
              Account
            </NavLink>
          ) : (
            <NavLink to="/login">Sign in</NavLink>
          )}
        </nav>
      </header>
      {nav}
      <main id="main" className={narrow ? 'page-main page-main-narrow' : 'page-main'}>
        {children}
      </main>
      <footer className="page-foot">
        <span>
          An aid. The tire maker’s table, the placard, local codes and licensed technicians come
          first.
        </span>
        <Link to="/help/safety">Safety</Link>
        <ThemeSwitch />
      </footer>
    </>
  );
}
