import { Link } from 'react-router';
import { FormErrors } from '~/components/form/form-errors';
import { AxleDrawing } from '~/components/tire/axle-drawing';
import { needWords } from '../coaches/coach-words';
import { missingForFill } from '../coaches/first-fill';
import type { FormAnswer } from '../coaches/form/read-form';
import { Afterwards } from './afterwards';
import { drawnAxles } from './drawn-axles';
import { findingsToSay, findingWords, outsideCompressorWords } from './finding-words';
import { needOf, type RoundTire, type RoundView } from './round-data';
import { groupsOf } from './tire-groups';
import { TireLine } from './tire-line';
import { lacksAir, verdictWord, wantsAction } from './verdict-words';

export interface RoundResultProps {
  view: RoundView;
  answer: FormAnswer | undefined;
}

/** What the cold check found, tire by tire, what was filled, and the way to the end. */
export function RoundResult({ view, answer }: RoundResultProps) {
  const { coach, round, tires, unit, mayRun } = view;
  const now = tires.map((tire) => ({ ...tire, verdict: needOf(tire) }));
  const general = answer?.problems.filter(({ name }) => name !== 'afterwards') ?? [];
  return (
    <div className="grid items-start gap-x-18 gap-y-10 lg:grid-cols-[470px_minmax(0,1fr)]">
      <div className="grid gap-5 lg:col-start-2">
        <h1>{round.closedAt ? 'What the round found' : 'What to do'}</h1>
        <FormErrors errors={general} />
        <p className="max-w-[24em] text-[25px] leading-tight">{needWords({ tires: now }, unit)}</p>
        <Notes view={view} />
        {!round.closedAt && mayRun && view.next && (
          <p>
            <Link to={`/rounds/${round.id}`}>Go on with the cold check</Link>
          </p>
        )}
        {groupsOf(now, coach.layout).map(({ title, group }) => (
          <section key={title} className="mt-3">
            <h2 className="border-b-2 border-ink pb-1">{title}</h2>
            <ul>
              {group.map((tire) => (
                <TireLine key={tire.position} view={view} tire={tire} />
              ))}
            </ul>
          </section>
        ))}
        {mayRun && !round.closedAt && <Afterwards view={view} answer={answer} />}
      </div>
      <div className={`lg:col-start-1 lg:row-start-1 ${round.closedAt ? '' : 'max-lg:hidden'}`}>
        <AxleDrawing unit={unit} axles={drawnAxles(coach.layout, now.map(placed))} />
      </div>
    </div>
  );
}

/** What concerns more than one tire, and what keeps any from being filled. */
function Notes({ view }: { view: RoundView }) {
  const { coach, fitting, mayEdit, tires, findings, unit } = view;
  const wanted = tires.some(({ fillable }) => fillable);
  const missing = wanted ? missingForFill({ ...coach, fitting }) : [];
  const words = [...findingsToSay(findings, tires).map((finding) => findingWords(finding, unit))];
  const outside = outsideCompressorWords(tires);
  if (outside) words.push(outside);
  if (view.round.closedAt || words.length + missing.length === 0) return null;
  return (
    <ul className="grid gap-2 border-l-8 border-out pl-4">
      {missing.map(({ words: what, link, to }) => (
        <li key={to}>
          {what} No fill can be started yet.{' '}
          {mayEdit ? <Link to={to}>{link}</Link> : 'The owner does that.'}
        </li>
      ))}
      {words.map((text) => (
        <li key={text}>{text}</li>
      ))}
    </ul>
  );
}

const placed = ({ position, kpa, wheel, verdict, fill }: RoundTire) => ({
  position,
  pressureKpa: fill?.endKpa ?? kpa ?? undefined,
  targetKpa: wheel.targetKpa,
  needsAir: lacksAir(verdict),
  note: wantsAction(verdict) ? verdictWord(verdict) : undefined,
});
