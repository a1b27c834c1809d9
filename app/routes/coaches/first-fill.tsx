import { Link } from 'react-router';
import type { CoachHead } from '~/queries/coach.server';

/** What stands between a new coach and its first fill. Nothing when all is done. */
export function FirstFill({
  coach,
}: {
  coach: Pick<CoachHead, 'id' | 'rig' | 'fitting' | 'mayEdit'>;
}) {
  const missing = missingForFill(coach);
  if (missing.length === 0) return null;
  return (
    <section className="border-2 border-dashed border-ink p-5">
      <h2 className="mb-2">Before the first fill</h2>
      <ul className="grid gap-2">
        {missing.map(({ words, link, to }) => (
          <li key={to}>
            {words} {coach.mayEdit ? <Link to={to}>{link}</Link> : 'The owner does that.'}
          </li>
        ))}
      </ul>
    </section>
  );
}

/** What of a coach keeps it from being filled, and where that is put right. */
export function missingForFill({ id, rig, fitting }: Pick<CoachHead, 'id' | 'rig' | 'fitting'>) {
  const air = `/coaches/${id}/air`;
  const missing: { words: string; link: string; to: string }[] = [];
  if (!rig) {
    missing.push({
      words: 'The hose, chuck and gauge are not described yet.',
      link: 'Describe them',
      to: `${air}#rig`,
    });
  }
  if (!fitting) {
    missing.push({
      words: 'The air fitting has not been tested yet.',
      link: 'Test the fitting',
      to: `${air}#fitting`,
    });
  } else if (fitting.outcome === 'no-air') {
    missing.push({
      words: 'The fitting gave no air.',
      link: 'Find another and test it',
      to: `${air}#fitting`,
    });
  }
  return missing;
}
