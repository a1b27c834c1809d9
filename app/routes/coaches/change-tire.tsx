import { Form, Link } from 'react-router';
import { Button } from '~/components/button';
import { ChoiceField } from '~/components/form/choice-field';
import { SelectField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { positionName } from '~/loads';
import type { FittedTire } from '~/queries/fitted-tires.server';
import { formatPressure, formatVolume, gaugeKpa, litres, type PressureUnit } from '~/units';
import { type FormAnswer, problemOf, shownValue } from './form/read-form';
import { TireInputs } from './tire-inputs';

export interface ChangeTireProps {
  tire: FittedTire;
  /** All of the coach's, for moving it. */
  tires: readonly FittedTire[];
  unit: PressureUnit;
  answer: FormAnswer | undefined;
}

/** Corrects a tire, replaces it, or lets it change places with another. */
export function ChangeTire({ tire, tires, unit, answer }: ChangeTireProps) {
  const about = (intent: string) => (answer?.values.intent === intent ? answer : undefined);
  const others = tires.filter(({ position }) => position !== tire.position);
  return (
    <section className="grid items-start gap-x-18 gap-y-10 border-2 border-ink p-5 lg:grid-cols-2">
      <DescribeForm tire={tire} unit={unit} answer={about('describe')} />
      <MoveForm tire={tire} others={others} answer={about('move')} />
    </section>
  );
}

interface DescribeFormProps {
  tire: FittedTire;
  unit: PressureUnit;
  answer: FormAnswer | undefined;
}

function DescribeForm({ tire, unit, answer }: DescribeFormProps) {
  return (
    <Form method="post" className="form" noValidate>
      <h2>{positionName(tire.position)}</h2>
      <FormErrors errors={answer?.problems ?? []} />
      <input type="hidden" name="position" value={tire.position} />
      <ChoiceField
        label="What happened"
        name="what"
        choices={[
          { value: 'corrected', label: 'It was typed wrong' },
          {
            value: 'replaced',
            label: 'Another tire was fitted',
            hint: 'The one before keeps its readings and fills.',
          },
        ]}
        defaultValue={shownValue(answer, 'what', 'corrected')}
        error={problemOf(answer, 'what')}
      />
      <TireInputs unit={unit} answer={answer} stored={shownTire(tire, unit)} />
      <div className="actions">
        <Button name="intent" value="describe">
          Keep it
        </Button>
        <Link to=".">Leave it as it was</Link>
      </div>
    </Form>
  );
}

interface MoveFormProps {
  tire: FittedTire;
  others: readonly FittedTire[];
  answer: FormAnswer | undefined;
}

function MoveForm({ tire, others, answer }: MoveFormProps) {
  return (
    <Form method="post" className="form" noValidate>
      <h2>Move it</h2>
      <FormErrors errors={answer?.problems ?? []} />
      <input type="hidden" name="position" value={tire.position} />
      <SelectField
        label="Changes places with"
        name="with"
        hint="Each tire goes with its wheel."
        options={others.map(({ position }) => ({ value: position, label: positionName(position) }))}
        defaultValue={shownValue(answer, 'with')}
        error={problemOf(answer, 'with')}
      />
      <Button className="justify-self-start" name="intent" value="move">
        Move both
      </Button>
    </Form>
  );
}

/** A tire as the fields show it. A volume that was estimated leaves its field empty. */
function shownTire(tire: FittedTire, unit: PressureUnit) {
  const pressure = (kpa: number) =>
    formatPressure(gaugeKpa(kpa), unit, { withUnit: false, trim: true });
  return {
    size: tire.size,
    sidewallLimit: pressure(tire.sidewallLimitKpa),
    wheelLimit: pressure(tire.wheelLimitKpa),
    volume:
      tire.volumeSource === 'typed' ? formatVolume(litres(tire.volumeL), { withUnit: false }) : '',
  };
}
