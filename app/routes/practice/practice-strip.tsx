import { useState } from 'react';
import { PressKey } from '~/components/live/press-key';
import type { PracticeReadOuts, PracticeSource } from '~/fill/practice-source';
import { formatPressure, gaugeKpa } from '~/units';

export interface PracticeStripProps {
  source: PracticeSource;
  now: PracticeReadOuts | undefined;
}

const speeds = [1, 2, 4];
const engineWords = { off: 'engine off', idle: 'idle', 'fast-idle': 'fast idle' };

/** The cab of the simulated coach: dash gauge, engine, the helper's pedal, and how time runs. */
export function PracticeStrip({ source, now }: PracticeStripProps) {
  const [speed, setSpeed] = useState(1);
  const by = source.setup.lowerBy?.[0] ?? 'pedal';
  const lowering = now?.lowering ?? false;
  const turnSpeed = () => {
    const next = speeds[(speeds.indexOf(speed) + 1) % speeds.length] ?? 1;
    source.setSpeed(next);
    setSpeed(next);
  };
  return (
    <section className="live-strip practice-strip" aria-label="The simulated coach">
      <p className="practice-dash">
        {now?.heard ? (
          <b>{now.heard === 'purge' ? 'You hear a purge.' : 'The low-air warning is on.'}</b>
        ) : (
          <>
            Dash <b>{now ? formatPressure(gaugeKpa(now.dashKpa), source.unit, dashDigits) : '–'}</b>
            <br />
            {now && engineWords[now.engine]}
          </>
        )}
      </p>
      <PressKey
        aria-pressed={lowering}
        onPress={(down) => source.tap({ type: 'lowering', by, on: !lowering }, down.at)}
      >
        {keyWords[by][lowering ? 'on' : 'off']}
      </PressKey>
      <PressKey aria-label={`Time runs ${speed} times`} onPress={turnSpeed}>
        Time {speed}×
      </PressKey>
    </section>
  );
}

const dashDigits = { digits: 0 };
const keyWords = {
  pedal: { off: 'Helper’s pedal', on: 'Pedal in use' },
  drain: { off: 'Supply drain', on: 'Drain open' },
};
