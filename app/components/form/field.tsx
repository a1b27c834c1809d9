import type { ComponentProps, ReactNode } from 'react';
import type { PressureUnit } from '~/units';

export interface FieldFrame {
  label: ReactNode;
  name: string;
  hint?: ReactNode;
  /** What was wrong and what is expected; shown beside the field. */
  error?: string;
  /** The element's id, `field-` and the name unless given. `FormErrors` links to it. */
  id?: string;
}

export const fieldId = (name: string): string => `field-${name}`;

/** Label, hint, entry and error of one field, tied together for a screen reader. */
function Frame({ frame, children }: { frame: FieldFrame & { id: string }; children: ReactNode }) {
  const { id, label, hint, error } = frame;
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      {hint && (
        <p className="field-hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      {children}
      {error && (
        <p className="field-error" id={`${id}-error`}>
          {error}
        </p>
      )}
    </div>
  );
}

function aria({ id, hint, error }: FieldFrame & { id: string }) {
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return { 'aria-invalid': error ? true : undefined, 'aria-describedby': described || undefined };
}

export type FieldProps = FieldFrame &
  Omit<ComponentProps<'input'>, 'id' | 'name'> & {
    /** Shown after the entry: "psi", "L". */
    unit?: string;
  };

/** A line of text. Give `defaultValue` what was typed when the form comes back with errors. */
export function Field({
  label,
  name,
  hint,
  error,
  id = fieldId(name),
  unit,
  ...input
}: FieldProps) {
  const frame = { label, name, hint, error, id };
  const className = unit ? 'input input-figure' : 'input';
  return (
    <Frame frame={frame}>
      <span className="field-entry">
        <input className={className} id={id} name={name} {...aria(frame)} {...input} />
        {unit && <span>{unit}</span>}
      </span>
    </Frame>
  );
}

/**
 * A pressure in the person's unit, as text: the server reads it with `parsePressure`, so that
 * `12..5` is refused beside the field and never lost by a number input.
 */
export function PressureField({ unit, ...field }: FieldProps & { unit: PressureUnit }) {
  return <Field unit={unit} inputMode="decimal" autoComplete="off" {...field} />;
}

export type SelectFieldProps = FieldFrame &
  Omit<ComponentProps<'select'>, 'id' | 'name'> & {
    options: readonly { value: string; label: string }[];
  };

/** One of a few, as a list that opens. */
export function SelectField(props: SelectFieldProps) {
  const { label, name, hint, error, id = fieldId(name), options, ...select } = props;
  const frame = { label, name, hint, error, id };
  return (
    <Frame frame={frame}>
      <select className="input" id={id} name={name} {...aria(frame)} {...select}>
        {options.map(({ value, label: text }) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
    </Frame>
  );
}
