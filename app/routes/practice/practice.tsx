import { useState } from 'react';
import { useRouteLoaderData, useSearchParams } from 'react-router';
import { type PracticeSituation, practiceSituations } from '~/fill/practice-starts';
import type { PressureUnit } from '~/units';
import type { Route } from './+types/practice';
import { PracticeList } from './practice-list';
import { PracticeRun } from './practice-run';

export default function Practice() {
  const [search] = useSearchParams();
  const [run, setRun] = useState({ count: 1, seed: 1 });
  const unit = usePressureUnit();
  const chosen = search.get('start');
  if (chosen === 'choose') return <PracticeList unit={unit} />;
  const situation = findSituation(chosen);
  return (
    <PracticeRun
      key={`${situation.key} ${run.count}`}
      situation={situation}
      seed={run.seed}
      unit={unit}
      onAgain={(isAnother) =>
        setRun({ count: run.count + 1, seed: isAnother ? run.seed + 1 : run.seed })
      }
    />
  );
}

export const meta: Route.MetaFunction = () => [
  { title: 'Practice · Valveside' },
  { name: 'description', content: 'Fill a tire on a simulated coach. No account, nothing saved.' },
];

const [firstSituation] = practiceSituations;

function findSituation(key: string | null): PracticeSituation {
  const found = practiceSituations.find((situation) => situation.key === key) ?? firstSituation;
  if (!found) throw new Error('there is no situation to practise');
  return found;
}

/** The unit of who is signed in; psi otherwise. */
function usePressureUnit(): PressureUnit {
  const root = useRouteLoaderData<{ viewer?: { pressureUnit: PressureUnit } | null }>('root');
  return root?.viewer?.pressureUnit ?? 'psi';
}
