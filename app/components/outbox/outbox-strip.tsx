import { useState } from 'react';
import { Link } from 'react-router';
import { Button } from '~/components/button';
import { openFillOf, pendingWords, refusedLine, refusedWords } from '~/fill/outbox-words';
import { thisPhone } from '~/fill/phone';
import type { OutboxState } from '~/fill/store';
import { useLasting, usePhoneState } from '~/fill/use-phone-state';

/** A request that is answered within this time needs no word, ms. */
const quietMs = 2000;

/** What of this phone's records the server has not; nothing while all is well. */
export function OutboxStrip() {
  const outbox = usePhoneState((state) => state.outbox);
  const isWaiting = useLasting(outbox.pending > 0, quietMs);
  const waiting = isWaiting || outbox.paused ? pendingWords(outbox) : null;
  const refused = refusedWords(outbox);
  if (!waiting && !refused) return null;
  return (
    <section className="live-strip px-4 py-1 text-[17px]" aria-label="Not yet at the server">
      <div className="flex flex-wrap items-center gap-x-4">
        <p role="status">{[waiting, refused].filter(Boolean).join(' ')}</p>
        {outbox.paused && <SignInAgain />}
      </div>
      {refused && <RefusedList outbox={outbox} />}
    </section>
  );
}

/** In another tab: what waits here lives in this page. */
function SignInAgain() {
  return (
    <>
      <a
        href="/login"
        target="_blank"
        rel="noreferrer"
        className="inline-flex min-h-11 items-center"
      >
        Sign in in another tab
      </a>
      <Button kind="small" type="button" onClick={() => thisPhone().outbox.resume()}>
        Send now
      </Button>
    </>
  );
}

function RefusedList({ outbox }: { outbox: OutboxState }) {
  const [open, setOpen] = useState(false);
  return (
    <div>
      <Button kind="small" type="button" aria-expanded={open} onClick={() => setOpen(!open)}>
        {open ? 'Hide them' : 'Show them'}
      </Button>{' '}
      <Button kind="small" type="button" onClick={() => thisPhone().outbox.retryRefused()}>
        Send again
      </Button>
      {open && (
        <ul className="max-h-[30dvh] list-disc overflow-auto pl-5">
          {outbox.refused.map((refused) => {
            const openFill = openFillOf(refused);
            return (
              <li key={refused.item.id}>
                {refusedLine(refused)}{' '}
                {openFill && <Link to={`/fills/${openFill}`}>Open that fill</Link>}
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
