import { NavLink } from 'react-router';

export interface CoachNavProps {
  coachId: string;
  /** The pages this person may open, in order; the first is the coach itself. */
  pages: readonly CoachPage[];
}

/** `path` is what follows `/coaches/:coachId/`; empty for the coach's own page. */
export interface CoachPage {
  path: string;
  name: string;
}

/** The ways between the pages of one coach. */
export function CoachNav({ coachId, pages }: CoachNavProps) {
  return (
    <nav className="coach-nav" aria-label="This coach">
      {pages.map(({ path, name }) => (
        <NavLink key={path} to={`/coaches/${coachId}${path ? `/${path}` : ''}`} end={path === ''}>
          {name}
        </NavLink>
      ))}
    </nav>
  );
}
