import { Form } from 'react-router';
import { Button } from '~/components/button';
import { cautionsPedal } from '~/components/caution-words';
import { Cautions } from '~/components/cautions';
import { ChoiceField } from '~/components/form/choice-field';
import { FormErrors } from '~/components/form/form-errors';
import type { AirSection } from './air-section';
import { problemOf } from './form/read-form';
import { Saved } from './form/saved';

/** How the supply may be brought down to cut-in on this coach. */
export function LowerForm({ coach, answer, saved }: AirSection) {
  return (
    <Form method="post" action="#lowering" className="form" id="lowering" noValidate>
      <div>
        <h2 className="mb-2">Bringing the supply down</h2>
        <p>The compressor loads again at cut-in. Say how this coach may be brought down to it.</p>
      </div>
      <FormErrors errors={answer?.problems ?? []} />
      <Saved when={saved}>The ways are kept.</Saved>
      <Cautions items={cautionsPedal} label="Before you choose the pedal" />
      <fieldset disabled={!coach.mayEdit} className="contents">
        <ChoiceField
          label="Ways that this coach allows"
          name="lowerBy"
          pick="many"
          hint="Tick none and you are never asked to."
          choices={[
            {
              value: 'drain',
              label: 'The supply tank’s drain',
              hint: 'Fast, done by one person, and it takes water with it.',
            },
            {
              value: 'pedal',
              label: 'The brake pedal',
              hint: 'The chassis manual allows it with the parking brake set.',
            },
          ]}
          defaultValue={answer?.values.lowerBy ?? coach.lowerBy}
          error={problemOf(answer, 'lowerBy')}
        />
      </fieldset>
      {coach.mayEdit && (
        <Button name="intent" value="lowering">
          Keep the ways
        </Button>
      )}
    </Form>
  );
}
