import type { ReactNode } from 'react';
import { Link, NavLink } from 'react-router';
import { Mark } from './mark';
import { ThemeSwitch } from './theme-switch';

export interface PageShellProps {
  /** Signed in: shows coaches and the account. Absent: the ways in. */
  viewer?: { email: string };
  /** A `<CoachNav>` below the head, on the pages of one coach. */
  nav?: ReactNode;
  /** Keeps running text to a readable measure. */
  narrow?: boolean;
  children: ReactNode;
}

/** The frame of every page but the live screen: mark, ways on, content, foot. */
export function PageShell({ viewer, nav, narrow = false, children }: PageShellProps) {
  return (
    <>
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <header className="page-head">
        <Link className="mark" to="/">
          <Mark />
          Valveside
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
