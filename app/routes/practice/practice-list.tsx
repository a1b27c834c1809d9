import { Link } from 'react-router';
import { PageShell } from '~/components/shell/page-shell';
import { practiceSituations } from '~/fill/practice-starts';
import { formatPressure, type PressureUnit, psi, psiToKpa } from '~/units';

/** The situations to choose from. */
export function PracticeList({ unit }: { unit: PressureUnit }) {
  const shown = (value: number, withUnit: boolean) =>
    formatPressure(psiToKpa(psi(value)), unit, { withUnit, trim: true });
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
                {shown(startPsi, false)} → {shown(targetPsi, true)}
              </span>
            </Link>
            <p>{about}</p>
          </li>
        ))}
      </ul>
    </PageShell>
  );
}
