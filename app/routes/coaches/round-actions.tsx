import { Link } from 'react-router';
import { ButtonLink } from '~/components/button';
import { usePhoneState } from '~/fill/use-phone-state';
import type { CoachHead, RoundHead } from '~/queries/coach.server';
import { dayWords } from './coach-words';

export interface RoundActionsProps {
  coach: Pick<CoachHead, 'id' | 'mayRun'>;
  rounds: { open: RoundHead | null; last: RoundHead | null };
  now: Date;
}

/** Starts a round or goes on with the one that is open, and leads to the last. */
export function RoundActions({ coach, rounds, now }: RoundActionsProps) {
  const open = useOpenRound(coach.id, rounds.open);
  return (
    <div className="actions">
      {coach.mayRun && open && (
        <ButtonLink kind="main" to={`/rounds/${open.id}`}>
          Continue the round of {dayWords(open.startedAt, now, open.timeZone)}
        </ButtonLink>
      )}
      {coach.mayRun && !open && (
        <ButtonLink kind="main" to={`/coaches/${coach.id}/rounds/new`}>
          Start a round
        </ButtonLink>
      )}
      {rounds.last && <Link to={`/rounds/${rounds.last.id}`}>Review the last one</Link>}
    </div>
  );
}

/** This phone may know of a round that the server doesn't, or that one is closed already. */
function useOpenRound(coachId: string, told: RoundHead | null) {
  const rounds = usePhoneState((state) => state.rounds);
  const own = Object.values(rounds).findLast(
    (round) => round.coachId === coachId && round.closedAt === null,
  );
  if (own) return { ...own, startedAt: new Date(own.startedAt) };
  return told && rounds[told.id]?.closedAt ? null : told;
}
