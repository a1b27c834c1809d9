import type { ReactNode } from 'react';
import { NavLink } from 'react-router';
import { PageShell } from '~/components/shell/page-shell';

const pages = [
  ['/help', 'How the cycle works'],
  ['/help/rig', 'The rig'],
  ['/help/safety', 'Safety'],
  ['/help/glossary', 'Words'],
] as const;

/** The frame of a page of help: its siblings, then the text. */
export function HelpPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <PageShell
      narrow
      nav={
        <nav className="coach-nav" aria-label="Help">
          {pages.map(([to, name]) => (
            <NavLink key={to} to={to} end>
              {name}
            </NavLink>
          ))}
        </nav>
      }
    >
      <article className="prose">
        <h1>{title}</h1>
        {children}
      </article>
    </PageShell>
  );
}
