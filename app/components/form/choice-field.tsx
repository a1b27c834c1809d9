import { type FieldFrame, fieldId } from './field';

interface Choice {
  value: string;
  label: string;
  hint?: string;
}

export interface ChoiceFieldProps extends FieldFrame {
  choices: readonly Choice[];
  /** `many` are boxes to tick, `one` is the default. */
  pick?: 'one' | 'many';
  defaultValue?: string | readonly string[];
  required?: boolean;
}

/** A few choices, all in sight: radio buttons, or boxes to tick with `pick="many"`. */
export function ChoiceField(props: ChoiceFieldProps) {
  const { label, name, hint, error, id = fieldId(name), choices, pick = 'one' } = props;
  const chosen = [props.defaultValue ?? []].flat();
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <fieldset className="field" id={id} tabIndex={-1} aria-describedby={described || undefined}>
      <legend>{label}</legend>
      {hint && (
        <p className="field-hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      <div>
        {choices.map((choice) => (
          <label className="choice" key={choice.value}>
            <input
              type={pick === 'one' ? 'radio' : 'checkbox'}
              name={name}
              value={choice.value}
              defaultChecked={chosen.includes(choice.value)}
              required={pick === 'one' && props.required}
            />
            <span>
              {choice.label}
              {choice.hint && <small>{choice.hint}</small>}
            </span>
          </label>
        ))}
      </div>
      {error && (
        <p className="field-error" id={`${id}-error`}>
          {error}
        </p>
      )}
    </fieldset>
  );
}
