import { useEffect, useMemo, useState } from 'react';
import { Link, useNavigate } from 'react-router';
import { LiveFill } from '~/components/live/live-fill';
import { OutboxStrip } from '~/components/outbox/outbox-strip';
import { keepCaughtUp } from '~/fill/catch-up';
import { endOf } from '~/fill/log';
import { thisPhone } from '~/fill/phone';
import { storeSource } from '~/fill/store-source';
import { usePhoneState } from '~/fill/use-phone-state';
import { positionName } from '~/loads';
import type { PressureUnit } from '~/units';

export interface RunningFillProps {
  runId: string;
  /** Where to go once the fill has ended and the server knows it. */
  after: string;
  unit: PressureUnit;
}

/** The wheel side of a real fill: the phone's store in, taps out. */
export function RunningFill({ runId, after, unit }: RunningFillProps) {
  const run = usePhoneState((state) => state.runs[runId]);
  const [wasRefused, setRefused] = useState(false);
  const tireName = run ? positionName(run.position) : '';
  const source = useMemo(() => {
    const onMayNotEnd = () => setRefused(true);
    return storeSource(thisPhone(), runId, { tireName, unit, onMayNotEnd });
  }, [runId, tireName, unit]);
  useEffect(() => keepCaughtUp(thisPhone(), runId, window), [runId]);
  useLeaveWhenEnded(runId, after);
  if (!run) return null;
  if (endOf(run.log)) return <Ended after={after} />;
  return (
    <LiveFill
      source={source}
      way={<Link to={`/rounds/${run.roundId}`}>Round</Link>}
      strip={
        <>
          <OutboxStrip />
          {wasRefused && (
            <p className="live-strip px-4" role="alert">
              The driver ends this fill.
            </p>
          )}
        </>
      }
    />
  );
}

/** Goes on by itself as soon as nothing of the fill waits to be sent. */
function useLeaveWhenEnded(runId: string, after: string): void {
  const navigate = useNavigate();
  const isSent = usePhoneState(({ runs, outbox }) => {
    const log = runs[runId]?.log ?? [];
    return endOf(log) !== undefined && outbox.pending === 0 && log.every(({ seq }) => seq !== null);
  });
  useEffect(() => {
    if (isSent) void navigate(after, { replace: true });
  }, [isSent, after, navigate]);
}

function Ended({ after }: { after: string }) {
  return (
    <main className="page">
      <h1>This fill has ended</h1>
      <p>Its last taps are on their way. The review opens when they are stored.</p>
      <OutboxStrip />
      <p>
        <Link to={after}>Go on now</Link>
      </p>
    </main>
  );
}
