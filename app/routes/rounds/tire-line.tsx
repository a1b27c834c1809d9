import { Form, Link, useNavigate } from 'react-router';
import { Button, ButtonLink } from '~/components/button';
import { positionName } from '~/loads';
import { beginFill } from './begin-fill';
import { whyNoFill } from './fill-words';
import { isFilled, type RoundTire, type RoundView } from './round-data';
import { shownPressure, verdictAdvice, verdictWord, wantsAction } from './verdict-words';

export interface TireLineProps {
  view: RoundView;
  tire: RoundTire;
}

/** One tire of the result: what was found, what to do, and the key that does it. */
export function TireLine({ view, tire }: TireLineProps) {
  const { position, kpa, wheel, verdict } = tire;
  const { unit, round, mayRun } = view;
  const open = mayRun && !round.closedAt;
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-rule py-4 sm:grid-cols-[minmax(0,1fr)_auto]">
      <div className="flex flex-wrap items-baseline gap-x-4">
        <h3>{positionName(position)}</h3>
        <span>
          {kpa === null ? 'not read' : <b>{shownPressure(kpa, unit)}</b>} of{' '}
          {shownPressure(wheel.targetKpa, unit)}
        </span>
        {!isFilled(tire) && kpa !== null && (
          <span className={wantsAction(verdict) ? 'needs' : undefined}>{verdictWord(verdict)}</span>
        )}
      </div>
      <div className="sm:col-start-1">
        <p className="max-w-[36em] empty:hidden">{adviceWords(view, tire)}</p>
        <p className="flex flex-wrap gap-x-6">
          {tire.fill && tire.fill.how !== null && (
            <Link
              className="inline-flex min-h-11 items-center"
              to={`/fills/${tire.fill.id}/review`}
            >
              Review the fill
            </Link>
          )}
          {open && !tire.fill && (
            <Link className="inline-flex min-h-11 items-center" to={`?tire=${position}`}>
              {kpa === null ? 'Read it' : 'Correct it'}
            </Link>
          )}
        </p>
      </div>
      {open && <FillKey view={view} tire={tire} />}
    </li>
  );
}

function adviceWords({ unit, round }: RoundView, tire: RoundTire): string {
  const { fill, wheel } = tire;
  if (fill?.how === null) return 'Its fill is open.';
  if (fill) {
    const at = fill.endKpa === null ? '' : ` It was gauged at ${shownPressure(fill.endKpa, unit)}.`;
    return `${endWords[fill.how ?? 'stopped']}${at}`;
  }
  if (round.closedAt && tire.kpa === null) return 'It was not read.';
  return verdictAdvice(tire, wheel.targetKpa, unit);
}

const endWords = {
  done: 'Filled to its target.',
  stopped: 'Its fill was stopped.',
  'cannot-reach': 'This supply cannot reach its target.',
};

/** Starts or goes on with the fill of a tire, or says why that can't be. */
function FillKey({ view, tire }: TireLineProps) {
  const navigate = useNavigate();
  const where = 'self-center sm:col-start-2 sm:row-span-2 sm:row-start-1';
  if (tire.fill?.how === null) {
    return (
      <ButtonLink kind="main" className={where} to={`/fills/${tire.fill.id}`}>
        Go on filling
      </ButtonLink>
    );
  }
  if (!tire.fillable || isFilled(tire)) return null;
  const why = whyNoFill(view, tire);
  if (why) return <p className={`${where} quiet max-w-[13em]`}>{why}</p>;
  return (
    <Form
      method="post"
      className={where}
      onSubmit={(event) => {
        event.preventDefault();
        void navigate(`/fills/${beginFill(view, tire)}`);
      }}
    >
      <input type="hidden" name="tireId" value={tire.wheel.tireId} />
      <Button kind="main" name="intent" value="fill" className="w-full">
        {tire.fill ? 'Fill it again' : 'Fill it'}
        <span className="only-heard"> {positionName(tire.position)}</span>
      </Button>
    </Form>
  );
}
