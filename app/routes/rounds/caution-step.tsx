import { Form } from 'react-router';
import { Button } from '~/components/button';
import { cautionDrain, cautionsBefore, cautionsPedal, deference } from '~/components/caution-words';
import { Cautions } from '~/components/cautions';
import { acknowledgeCautions } from '~/fill/commands';
import type { RoundView } from './round-data';

/** Read once a round, before the first tire. */
export function CautionStep({ view: { round, coach } }: { view: RoundView }) {
  const { lowerBy } = coach;
  return (
    <div className="grid max-w-[44rem] gap-8">
      <h1>Before the first tire</h1>
      <Cautions items={cautionsBefore} label="Before the first tire" />
      {lowerBy.length > 0 && (
        <section className="grid gap-4">
          <h2>When the supply is brought down</h2>
          {lowerBy.includes('pedal') ? (
            <Cautions items={[...cautionsPedal, cautionDrain]} label="When it is brought down" />
          ) : (
            <Cautions items={drainOnly} label="When it is brought down" />
          )}
        </section>
      )}
      <p className="quiet">{deference}</p>
      <Form
        method="post"
        onSubmit={(event) => {
          event.preventDefault();
          acknowledgeCautions(round.id);
          window.scrollTo(0, 0);
        }}
      >
        <Button kind="main" name="intent" value="cautions" className="w-full sm:w-auto">
          I have read this
        </Button>
      </Form>
    </div>
  );
}

const drainOnly = [
  'Use the supply tank’s drain. Leave the brake pedal alone on this coach.',
  'Stop at the low-air warning.',
];
