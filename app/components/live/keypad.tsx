import { type ReactNode, use, useId } from 'react';
import { PressClockContext, PressKey, type Stamp } from './press-key';

export interface KeypadProps {
  /** "Tire gauge reads, psi" */
  label: string;
  /** What a simulated gauge shows. */
  shows?: string;
  text: string;
  /** What was wrong and what is expected, beside the field. */
  problem?: string;
  onText: (text: string) => void;
  onEnter: (down: Stamp) => void;
  /** A row of keys under the digits: back, more. */
  children?: ReactNode;
}

const digits = ['7', '8', '9', '4', '5', '6', '1', '2', '3', '.', '0'];
/** As many characters as the widest pressure with its unit typed out. */
const longest = 10;

/** The large keypad: a line to read, twelve keys, Enter. A hardware keyboard works too. */
export function Keypad(props: KeypadProps) {
  const { label, shows, text, problem, onText, onEnter } = props;
  const id = useId();
  const clock = use(PressClockContext);
  return (
    <div className="keypad">
      <div className="keypad-entry" data-wrong={problem ? true : undefined}>
        <label htmlFor={id}>
          <span>{label}</span>
          {shows && <b className="gauge-shows">{shows}</b>}
        </label>
        <input
          id={id}
          // The phone's own keyboard stays away; a hardware one still types.
          inputMode="none"
          autoComplete="off"
          maxLength={longest}
          value={text}
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem ? `${id}-problem` : undefined}
          onChange={(event) => onText(event.target.value)}
          onKeyDown={(event) => {
            if (event.key === 'Enter') onEnter(clock.stamp());
          }}
        />
        <PressKey className="keypad-enter key-in" onPress={onEnter}>
          Enter
        </PressKey>
      </div>
      {problem && (
        <p className="keypad-problem" id={`${id}-problem`} role="alert">
          {problem}
        </p>
      )}
      <div className="key-row keypad-digits">
        {digits.map((digit) => (
          <PressKey
            key={digit}
            className="key-value"
            onPress={() => onText((text + digit).slice(0, longest))}
          >
            {digit}
          </PressKey>
        ))}
        <PressKey onPress={() => onText(text.slice(0, -1))}>Erase</PressKey>
      </div>
      {props.children}
    </div>
  );
}
