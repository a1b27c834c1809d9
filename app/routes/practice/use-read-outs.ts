import { useEffect, useState } from 'react';
import type { PracticeReadOuts, PracticeSource } from '~/fill/practice-source';

/** The simulated gauges follow the coach five times a second. */
const hz = 5;

/** What gauges and ears say now; undefined on the server and in the first frame. */
export function useReadOuts(source: PracticeSource): PracticeReadOuts | undefined {
  const [now, setNow] = useState<PracticeReadOuts>();
  useEffect(() => {
    const read = () => setNow(source.readOuts());
    read();
    const timer = setInterval(read, 1000 / hz);
    return () => clearInterval(timer);
  }, [source]);
  return now;
}
