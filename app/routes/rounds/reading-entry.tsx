import { useState, useSyncExternalStore } from 'react';
import { Form } from 'react-router';
import { Button } from '~/components/button';
import { PressureField } from '~/components/form/field';
import { FormErrors } from '~/components/form/form-errors';
import { Keypad } from '~/components/live/keypad';
import { problemWords } from '~/fill/entry-words';
import { runFlatShare } from '~/loads';
import { type PressureUnit, parsePressure } from '~/units';
import { type FormAnswer, problemOf, shownValue } from '../coaches/form/read-form';
import type { RoundTire } from './round-data';
import { shownPressure } from './verdict-words';

export interface ReadingEntryProps {
  tire: RoundTire;
  unit: PressureUnit;
  /** How the switch stands at first. */
  warm: boolean;
  answer: FormAnswer | undefined;
  onEnter: (kpa: number, warm: boolean) => void;
}

const nothingChanges = () => () => undefined;
const useHasScript = () =>
  useSyncExternalStore(
    nothingChanges,
    () => true,
    () => false,
  );

/** Where a tire's pressure is typed: the large keypad, or a plain form where no script runs. */
export function ReadingEntry(props: ReadingEntryProps) {
  return useHasScript() ? <KeypadEntry {...props} /> : <PlainEntry {...props} />;
}

function KeypadEntry({ tire, unit, warm: warmAtFirst, onEnter }: ReadingEntryProps) {
  const [text, setText] = useState('');
  const [warm, setWarm] = useState(warmAtFirst);
  const [problem, setProblem] = useState<string>();
  const [asked, setAsked] = useState<string>();
  const enter = () => {
    const parsed = parsePressure(text, unit);
    if (!parsed.ok) return setProblem(problemWords(parsed, unit));
    const far = asked === text ? undefined : farWords(parsed.value, tire, unit);
    if (!far) return onEnter(parsed.value, warm);
    setAsked(text);
    setProblem(far);
  };
  return (
    <form
      className="border border-t-0 border-ink [&_.keypad-digits_.key]:min-h-18 [&_.keypad]:h-auto"
      onSubmit={(event) => {
        event.preventDefault();
        enter();
      }}
    >
      <Keypad
        label={`Tire gauge reads, ${unit}`}
        text={text}
        problem={problem}
        onText={(typed) => {
          setText(typed);
          setProblem(undefined);
        }}
        onEnter={enter}
      />
      <label className="flex min-h-[72px] items-center gap-4 border-t border-ink px-4">
        <input
          type="checkbox"
          className="size-8 flex-none accent-in"
          checked={warm}
          onChange={(event) => setWarm(event.currentTarget.checked)}
        />
        <span>Warm: driven within three hours, or in the sun</span>
      </label>
    </form>
  );
}

/** A reading far from its target is asked about once, never refused and never changed. */
function farWords(kpa: number, { wheel }: RoundTire, unit: PressureUnit): string | undefined {
  if (kpa > runFlatShare * wheel.targetKpa && kpa <= wheel.limitKpa) return undefined;
  return `${shownPressure(kpa, unit)} is far from its target. Press Enter again if the gauge shows it.`;
}

function PlainEntry({ tire, unit, warm, answer }: ReadingEntryProps) {
  const about = answer?.values.tireId === tire.wheel.tireId ? answer : undefined;
  return (
    <Form method="post" className="form" noValidate>
      <FormErrors errors={about?.problems ?? []} />
      <input type="hidden" name="tireId" value={tire.wheel.tireId} />
      <PressureField
        label="Tire gauge reads"
        name="kpa"
        unit={unit}
        defaultValue={shownValue(about, 'kpa')}
        error={problemOf(about, 'kpa')}
      />
      <label className="choice">
        <input type="checkbox" name="warm" value="yes" defaultChecked={warm} />
        <span>Warm: driven within three hours, or in the sun</span>
      </label>
      <Button kind="main" name="intent" value="reading">
        Enter
      </Button>
    </Form>
  );
}
