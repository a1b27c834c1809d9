import { Form } from 'react-router';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { FormErrors } from '~/components/form/form-errors';
import type { CoachHead } from '~/queries/coach.server';
import { formatPressureDifference, kpaDifference, kpaPerPsi, type PressureUnit } from '~/units';
import type { AirSection } from './air-section';
import { dayWords } from './coach-words';
import { problemOf, shownValue } from './form/read-form';
import { Saved } from './form/saved';

type Outcome = NonNullable<CoachHead['fitting']>['outcome'];

const outcomeWords: Record<Outcome, string> = {
  'follows-supply': 'It follows the supply. You can fill from it.',
  'accessory-tank':
    'It sits on an accessory tank, which keeps the peak. You can fill from it while that tank lasts.',
  'no-air': 'It gives no air. Find another fitting and test that one.',
};

/** Not every fitting gives air, or the coach's own: three steps find out. */
export function FittingTest({ coach, unit, now, answer, saved }: AirSection) {
  const { fitting, mayEdit } = coach;
  return (
    <Form method="post" action="#fitting" className="form" id="fitting" noValidate>
      <div>
        <h2 className="mb-2">The fitting test</h2>
        <p>
          {fitting
            ? `Tested ${dayWords(fitting.testedAt, now)}. ${outcomeWords[fitting.outcome]}`
            : 'Not every fitting gives air. Some give that of a small tank. Find out before the first fill.'}
        </p>
      </div>
      <FormErrors errors={answer?.problems ?? []} />
      <Saved when={saved}>The outcome is kept.</Saved>
      {mayEdit && (
        <>
          <TestSteps unit={unit} />
          <ChoiceField
            label="What the gauge did"
            name="outcome"
            choices={[
              { value: 'follows-supply', label: 'It fell with the supply' },
              {
                value: 'accessory-tank',
                label: 'It gave air and stayed where it was',
                hint: 'The fitting sits on an accessory tank behind a check valve.',
              },
              {
                value: 'no-air',
                label: 'No air came out',
                hint: 'A tow-in inlet may hold a one-way valve.',
              },
            ]}
            defaultValue={shownValue(answer, 'outcome')}
            error={problemOf(answer, 'outcome')}
          />
          <Button name="intent" value="fitting">
            Keep the outcome
          </Button>
        </>
      )}
    </Form>
  );
}

/** By how much the supply is brought down, kPa: ten of a dash gauge's psi can be seen on it. */
const testFallKpa = 10 * kpaPerPsi;

function TestSteps({ unit }: { unit: PressureUnit }) {
  const fall = formatPressureDifference(kpaDifference(testFallKpa), unit, {
    digits: unit === 'bar' ? 1 : 0,
  });
  return (
    <ol className="grid list-decimal gap-3 pl-6">
      <li>
        Park on level ground with the wheels chocked. Let the supply reach cut-out. Stop the engine.
      </li>
      <li>Connect the hose. Point the chuck away and open it for a moment. Does air come out?</li>
      <li>
        Note the gauge. Bring the supply down by {fall}, as this coach allows. Stop at the low-air
        warning.
      </li>
      <li>Look at the gauge again. Did it fall with the supply?</li>
    </ol>
  );
}
