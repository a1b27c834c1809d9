import { useEffect, useRef } from 'react';
import { fieldId } from './field';

export interface FormErrorsProps {
  /** What was wrong, in the order of the fields. Without a `name` it belongs to the whole form. */
  errors: readonly { name?: string; message: string }[];
}

/** The summary above a form that came back: each line leads to its field. Takes the focus. */
export function FormErrors({ errors }: FormErrorsProps) {
  const box = useRef<HTMLDivElement>(null);
  const key = errors.map((error) => error.message).join('\n');
  useEffect(() => {
    if (key) box.current?.focus();
  }, [key]);
  if (errors.length === 0) return null;
  return (
    <div className="form-errors" role="alert" tabIndex={-1} ref={box}>
      <h2>{errors.length === 1 ? 'One thing to put right' : 'Some things to put right'}</h2>
      <ul>
        {errors.map(({ name, message }) => (
          <li key={`${name} ${message}`}>
            {name ? <a href={`#${fieldId(name)}`}>{message}</a> : message}
          </li>
        ))}
      </ul>
    </div>
  );
}
