import { useEffect, useState } from 'react';
import { createPracticeCoach, type PracticeCoach } from '~/air';
import { Button } from '~/components/button';
import { LiveVessel } from '~/components/live/live-vessel';
import { drawVessel } from '~/fill/vessel-state';
import { psi, psiToKpa } from '~/units';

const kpa = (value: number) => psiToKpa(psi(value));

/** An invented coach and tire. Its time runs four times as fast, so that a cycle can be waited for. */
const tire = { startKpa: kpa(101), targetKpa: kpa(106), toleranceKpa: kpa(1), volumeL: 105 };
const governor = { cutInKpa: kpa(92), cutOutKpa: kpa(119) };
const speed = 4;
const frameMs = 100;

const newCoach = () =>
  createPracticeCoach({
    seed: 3,
    tire,
    governor,
    supplyKpa: kpa(95),
    engine: 'fast-idle',
    loaded: true,
    pedalDropsIdle: false,
  });

interface Moment {
  supplyKpa: number;
  tireKpa: number;
  chuckOn: boolean;
  pedal: boolean;
}

/** A coach's supply and one tire, running: chuck and pedal are the visitor's. */
export function LandingLevel() {
  const [coach, setCoach] = useState(newCoach);
  const [pedal, setPedal] = useState(false);
  const [now, setNow] = useState(() => momentOf(coach, false));
  useEffect(() => {
    const timer = setInterval(() => {
      coach.advance((frameMs / 1000) * speed);
      setNow(momentOf(coach, pedal));
    }, frameMs);
    return () => clearInterval(timer);
  }, [coach, pedal]);
  const startAgain = () => {
    const fresh = newCoach();
    setCoach(fresh);
    setPedal(false);
    setNow(momentOf(fresh, false));
  };
  return (
    <section className="landing-level" aria-label="A running level">
      <p className="landing-call" data-side={now.supplyKpa > now.tireKpa ? 'on' : 'off'}>
        <b>{callOf(now)}</b>
        <span>{whyOf(now)}</span>
      </p>
      <div className="landing-vessel">
        <LiveVessel vessel={vesselOfMoment(now)} />
      </div>
      <div className="landing-keys">
        <Button
          type="button"
          aria-pressed={now.chuckOn}
          onClick={() => {
            coach.setChuck(!coach.chuckOn());
            setNow(momentOf(coach, pedal));
          }}
        >
          {now.chuckOn ? 'Take the chuck off' : 'Put the chuck on'}
        </Button>
        <Button
          type="button"
          aria-pressed={pedal}
          onClick={() => {
            coach.setLowering('pedal', !pedal);
            setPedal(!pedal);
          }}
        >
          {pedal ? 'Let the pedal go' : 'Press the pedal'}
        </Button>
        <Button type="button" onClick={startAgain}>
          Start again
        </Button>
      </div>
    </section>
  );
}

function momentOf(coach: PracticeCoach, pedal: boolean): Moment {
  return {
    supplyKpa: coach.supplyKpa(),
    tireKpa: coach.settledKpa(),
    chuckOn: coach.chuckOn(),
    pedal,
  };
}

function vesselOfMoment({ supplyKpa, tireKpa }: Moment) {
  const exactly = (value: number) => ({ p10: value, p50: value, p90: value });
  const cutInKpa = exactly(governor.cutInKpa);
  const cutOutKpa = exactly(governor.cutOutKpa);
  const figures = { supplyKpa: exactly(supplyKpa), tireKpa, cutInKpa, cutOutKpa, known: true };
  return drawVessel(figures, tire, 'psi');
}

function callOf({ supplyKpa, tireKpa, chuckOn }: Moment): string {
  if (tireKpa > tire.targetKpa) return chuckOn ? 'Take it off' : 'Done';
  if (supplyKpa > tireKpa) return chuckOn ? 'Keep it on' : 'Put it on';
  return chuckOn ? 'Take it off' : 'Wait';
}

function whyOf({ supplyKpa, tireKpa, chuckOn }: Moment): string {
  if (tireKpa > tire.targetKpa) return chuckOn ? 'It is past the target.' : 'It is at the target.';
  if (supplyKpa > tireKpa) return chuckOn ? 'Air goes in.' : 'Supply is above the tire.';
  return chuckOn ? 'Air comes out.' : 'On now would let air out.';
}
