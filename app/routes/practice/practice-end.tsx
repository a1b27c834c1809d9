import { Link } from 'react-router';
import { Button } from '~/components/button';
import { PageShell } from '~/components/shell/page-shell';
import type { PracticeResult, PracticeSource } from '~/fill/practice-source';
import type { PracticeSituation } from '~/fill/practice-starts';
import {
  formatPressure,
  formatPressureDifference,
  gaugeKpa,
  kpaDifference,
  type PressureUnit,
} from '~/units';

export interface PracticeEndProps {
  source: PracticeSource;
  situation: PracticeSituation;
  onAgain: (isAnother: boolean) => void;
}

/** What came of it: the simulated coach knows the truth that a real one keeps to itself. */
export function PracticeEnd({ source, situation, onAgain }: PracticeEndProps) {
  const result = source.result();
  const { unit, setup } = source;
  return (
    <PageShell narrow>
      <h1>{headline(result, setup.tire.targetKpa)}</h1>
      <p className="practice-say">{verdict(result, setup.tire, unit)}</p>
      <dl className="facts">
        <Fact name="Tire, settled" value={formatPressure(gaugeKpa(result.settledKpa), unit)} />
        <Fact name="Target" value={formatPressure(gaugeKpa(setup.tire.targetKpa), unit)} />
        <Fact
          name="Air lost"
          value={formatPressureDifference(kpaDifference(result.lostKpa), unit)}
        />
        <Fact name="Put on" value={result.timesOn === 1 ? 'once' : `${result.timesOn} times`} />
        <Fact name="Time" value={minutes(result.seconds)} />
      </dl>
      <div className="actions">
        <Button kind="main" onClick={() => onAgain(false)}>
          Do it again
        </Button>
        <Button onClick={() => onAgain(true)}>Another coach, same job</Button>
        <Link to="/practice?start=choose">Another situation</Link>
      </div>
      <p className="quiet practice-after">
        This was “{situation.name}”. Nothing of it is saved. At your own wheel the same screen runs
        on what you tap.
      </p>
    </PageShell>
  );
}

function Fact({ name, value }: { name: string; value: string }) {
  return (
    <div>
      <dt>{name}</dt>
      <dd>{value}</dd>
    </div>
  );
}

/** Less than this is no loss that a gauge would show: 0.1 psi. */
const noticedLossKpa = 0.7;

function headline({ withinTolerance, settledKpa }: PracticeResult, targetKpa: number): string {
  if (withinTolerance) return 'Within tolerance';
  return settledKpa < targetKpa ? 'Not there yet' : 'Over the target';
}

function verdict(
  { withinTolerance, settledKpa, lostKpa }: PracticeResult,
  tire: { targetKpa: number; toleranceKpa: number },
  unit: PressureUnit,
): string {
  const off = formatPressureDifference(kpaDifference(Math.abs(settledKpa - tire.targetKpa)), unit);
  const side = settledKpa < tire.targetKpa ? 'below' : 'above';
  const loss =
    lostKpa > noticedLossKpa
      ? ` ${formatPressureDifference(kpaDifference(lostKpa), unit)} went back into the coach while the supply was below the tire.`
      : ' No air went back into the coach.';
  const end = withinTolerance
    ? `It settles ${off} ${side} the target.`
    : `It settles ${off} ${side} the target, outside the tolerance of ${formatPressureDifference(kpaDifference(tire.toleranceKpa), unit)}.`;
  return end + loss;
}

function minutes(seconds: number): string {
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)} min ${whole % 60} s`;
}
