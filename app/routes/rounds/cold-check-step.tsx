import { Link, useSearchParams } from 'react-router';
import { AxleDrawing } from '~/components/tire/axle-drawing';
import { recordColdReading } from '~/fill/commands';
import { positionName } from '~/loads';
import type { FormAnswer } from '../coaches/form/read-form';
import { drawnAxles } from './drawn-axles';
import { ReadingEntry } from './reading-entry';
import type { RoundTire, RoundView } from './round-data';
import { lacksAir, shownPressure, verdictWord, wantsAction } from './verdict-words';

export interface ColdCheckStepProps {
  view: RoundView;
  /** The one that is read now. */
  tire: RoundTire;
  answer: FormAnswer | undefined;
}

/** The cold check: one tire after another, once round the coach. */
export function ColdCheckStep({ view, tire, answer }: ColdCheckStepProps) {
  const [, setSearch] = useSearchParams();
  const { round, tires, unit } = view;
  const read = tires.filter(({ kpa }) => kpa !== null).length;
  const last = newestRead(view);
  const keep = (kpa: number, warm: boolean) => {
    recordColdReading(round.id, { tireId: tire.wheel.tireId, kpa, warm });
    setSearch({}, { preventScrollReset: true, replace: true });
  };
  return (
    <div className="grid items-start gap-x-18 gap-y-8 lg:grid-cols-[minmax(0,470px)_minmax(0,1fr)]">
      <section className="grid max-w-[470px] gap-3 lg:col-start-2">
        <div>
          <h1>{positionName(tire.position)}</h1>
          <p className="mt-1">
            {tire.kpa === null
              ? `Tire ${read + 1} of ${tires.length}. `
              : `It read ${shownPressure(tire.kpa, unit)}. Enter it again to correct it. `}
            Its target is {shownPressure(tire.wheel.targetKpa, unit)}.
          </p>
        </div>
        <ReadingEntry
          tire={tire}
          unit={unit}
          warm={tire.kpa === null ? (last?.warm ?? false) : tire.warm}
          answer={answer}
          onEnter={keep}
        />
        <p role="status" className="min-h-11">
          {last && tire.kpa === null && <LastRead tire={last} unit={unit} />}
        </p>
        <p className="actions">
          {tire.kpa !== null && <Link to={`/rounds/${round.id}`}>Leave it as it was</Link>}
          {!view.complete && <Link to="?end">End the check here</Link>}
        </p>
      </section>
      <div className="lg:col-start-1 lg:row-start-1">
        <AxleDrawing unit={unit} axles={drawnAxles(view.coach.layout, placed(view, tire))} />
      </div>
    </div>
  );
}

function LastRead({ tire, unit }: { tire: RoundTire; unit: RoundView['unit'] }) {
  return (
    <>
      {positionName(tire.position)}: {shownPressure(tire.kpa ?? 0, unit)},{' '}
      {verdictWord(tire.verdict)}.{' '}
      <Link className="inline-flex min-h-11 items-center" to={`?tire=${tire.position}`}>
        Correct it
      </Link>
    </>
  );
}

/** The tire whose reading came last. */
function newestRead({ round, tires }: RoundView): RoundTire | undefined {
  const newest = round.readings.at(-1);
  return tires.find(({ wheel }) => wheel.tireId === newest?.tireId);
}

const placed = ({ tires }: RoundView, current: RoundTire) =>
  tires.map(({ position, kpa, wheel, verdict }) => ({
    position,
    pressureKpa: kpa ?? undefined,
    targetKpa: wheel.targetKpa,
    needsAir: lacksAir(verdict),
    note: wantsAction(verdict) ? verdictWord(verdict) : undefined,
    href: `?tire=${position}`,
    current: position === current.position,
  }));
