import { useState, useSyncExternalStore } from 'react';
import { Link } from 'react-router';
import { LiveFill } from '~/components/live/live-fill';
import { createPracticeSource, type PracticeSource } from '~/fill/practice-source';
import { type PracticeSituation, practiceStart } from '~/fill/practice-starts';
import { formatPressure, gaugeKpa, type PressureUnit } from '~/units';
import { PracticeEnd } from './practice-end';
import { PracticeStrip } from './practice-strip';
import { useReadOuts } from './use-read-outs';

const hint = 'Do what the big words say. Tap what the gauge shows.';

export interface PracticeRunProps {
  situation: PracticeSituation;
  seed: number;
  unit: PressureUnit;
  onAgain: (isAnother: boolean) => void;
}

/** One practice from start to end; another one is another React key. */
export function PracticeRun({ situation, seed, unit, onAgain }: PracticeRunProps) {
  const [source] = useState(() => newSource(situation, seed, unit));
  const ended = useSyncExternalStore(source.subscribe, source.ended, source.ended);
  if (ended) return <PracticeEnd source={source} situation={situation} onAgain={onAgain} />;
  return <PracticeFill source={source} />;
}

function newSource(situation: PracticeSituation, seed: number, unit: PressureUnit) {
  return createPracticeSource(
    practiceStart(situation, seed, unit),
    () => performance.now() / 1000,
    new Date(),
  );
}

function PracticeFill({ source }: { source: PracticeSource }) {
  const now = useReadOuts(source);
  const { unit } = source;
  const shown = (kpa: number, digits?: number) =>
    formatPressure(gaugeKpa(kpa), unit, { withUnit: false, digits });
  return (
    <LiveFill
      source={source}
      hint={hint}
      shows={
        now && {
          hose: shown(now.hoseKpa, unit === 'psi' ? 0 : undefined),
          tire: now.tireKpa === undefined ? '–' : shown(now.tireKpa),
        }
      }
      way={<Link to="/practice?start=choose">Change</Link>}
      strip={<PracticeStrip source={source} now={now} />}
    />
  );
}
