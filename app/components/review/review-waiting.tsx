import { useEffect, useState } from 'react';
import { useRevalidator } from 'react-router';
import { Button } from '~/components/button';
import { looksUntilLong, nextLookMs } from './next-look';

/** What stands in place of a result that is being computed; asks for it until it is there. */
export function ReviewWaiting() {
  const { revalidate, state } = useRevalidator();
  const [looks, setLooks] = useState(0);
  const wait = nextLookMs(looks);
  useEffect(() => {
    if (wait === undefined || state !== 'idle') return;
    const timer = setTimeout(() => {
      setLooks(looks + 1);
      void revalidate();
    }, wait);
    return () => clearTimeout(timer);
  }, [wait, state, looks, revalidate]);
  return (
    <div className="review-waiting">
      {wait !== undefined && <progress aria-label="Working out the result" />}
      <p role="status">{waitingWords(looks, wait === undefined)}</p>
      {wait === undefined && (
        <Button type="button" onClick={() => setLooks(0)}>
          Look again
        </Button>
      )}
      <noscript>
        <p>Load this page again in a few seconds.</p>
      </noscript>
    </div>
  );
}

function waitingWords(looks: number, gaveUp: boolean): string {
  if (gaveUp) return 'The result is not there yet. Everything that was recorded is kept.';
  if (looks > looksUntilLong) return 'The result takes longer than usual. The record is kept.';
  return 'The result is being worked out from the record.';
}
