import { Link } from 'react-router';
import { PageShell } from '~/components/shell/page-shell';
import { practiceSituations } from '~/fill/practice-starts';

/** The situations to choose from. */
export function PracticeList() {
  return (
    <PageShell narrow>
      <h1>Practice</h1>
      <p className="practice-say">
        A simulated coach, alone. You are at the wheel and at the pedal. Nothing is saved.
      </p>
      <ul className="ways">
        {practiceSituations.map(({ key, name, about, startPsi, targetPsi }) => (
          <li key={key}>
            <Link to={`/practice?start=${key}`}>
              <b>{name}</b>
              <span>
                {startPsi} → {targetPsi} psi
              </span>
            </Link>
            <p>{about}</p>
          </li>
        ))}
      </ul>
    </PageShell>
  );
}
