import { useEffect, useMemo, useRef, useState, useSyncExternalStore } from 'react';
import { type Advice, createFill, type FillEvent } from '~/air';
import { LiveReader, type LiveSource, lastCallShown } from './live-driver';

export interface LiveView {
  /** Seconds since the fill's start that the advice is for. */
  at: number;
  /** Undefined until the first advice: the server's page and the first frame have none. */
  advice: Advice | undefined;
  events: readonly FillEvent[];
  ended: boolean;
}

/**
 * Runs the engine over a source's log and advises `hz` times a second (two to four). Keeps one
 * fill for as long as the source is the same, and records `call-shown` when the call changes.
 */
export function useLive(source: LiveSource, { hz = 3 }: { hz?: number } = {}): LiveView {
  const events = useSyncExternalStore(source.subscribe, source.events, source.events);
  const ended = useSyncExternalStore(source.subscribe, source.ended, source.ended);
  const reader = useMemo(
    () => ({ source, current: undefined as LiveReader | undefined }),
    [source],
  );
  const shown = useRef<{ source: LiveSource; call: Advice['call'] | undefined }>(undefined);
  const [now, setNow] = useState<{ source: LiveSource; at: number; advice: Advice }>();

  useEffect(() => {
    const advise = () => {
      reader.current ??= new LiveReader(createFill(reader.source.setup));
      const at = source.now();
      reader.current.read(events);
      setNow({ source, at, advice: reader.current.advise(at) });
    };
    advise();
    if (ended) return;
    const timer = setInterval(advise, 1000 / hz);
    return () => clearInterval(timer);
  }, [source, reader, events, ended, hz]);

  const call = now?.source === source ? now.advice.call : undefined;
  useEffect(() => {
    if (!call || ended) return;
    if (shown.current?.source !== source) {
      shown.current = { source, call: lastCallShown(source.events()) };
    }
    if (shown.current.call === call) return;
    shown.current.call = call;
    source.tap({ type: 'call-shown', call }, source.now());
  }, [source, call, ended]);

  const fresh = now?.source === source ? now : undefined;
  return { at: fresh?.at ?? source.now(), advice: fresh?.advice, events, ended };
}
