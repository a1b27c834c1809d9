import type { Believed, LearnedAir } from '~/queries/air-profile.server';
import type { PressureUnit } from '~/units';
import { shownPressure } from '../rounds/verdict-words';
import { dayWords } from './coach-words';

export interface LearnedAirProps {
  learned: LearnedAir | null;
  unit: PressureUnit;
  now: Date;
}

/** What the fills have taught about this coach's supply. */
export function LearnedAirWords({ learned, unit, now }: LearnedAirProps) {
  return (
    <section id="learned" className="grid max-w-[34rem] gap-3">
      <h2>What has been learned</h2>
      {learned ? (
        <>
          <p>
            {learned.fills === 1 ? 'One fill has' : `${learned.fills} fills have`} taught it, the
            last on {dayWords(learned.learnedAt, now)}. {rigWords(learned)}
          </p>
          <dl className="hair">
            <Figure name="Cut-in" believed={learned.cutInKpa} unit={unit} />
            <Figure name="Cut-out" believed={learned.cutOutKpa} unit={unit} />
          </dl>
        </>
      ) : (
        <p>Nothing yet. The first fill teaches where this governor cuts in and out.</p>
      )}
    </section>
  );
}

function rigWords({ hose, chuck, gauge }: LearnedAir): string {
  const names = [hose, chuck, gauge].filter(Boolean);
  return names.length > 0 ? `Learned with: ${names.join(', ')}.` : '';
}

interface FigureProps {
  name: string;
  believed: Believed | null;
  unit: PressureUnit;
}

function Figure({ name, believed, unit }: FigureProps) {
  if (!believed) return null;
  const { low, middle, high } = believed;
  return (
    <div className="flex justify-between gap-6 border-b border-rule py-2">
      <dt>{name}</dt>
      <dd>
        <b>about {shownPressure(middle, unit)}</b>, likely {shownPressure(low, unit)} to{' '}
        {shownPressure(high, unit)}
      </dd>
    </div>
  );
}
