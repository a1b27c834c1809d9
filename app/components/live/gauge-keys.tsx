import { PressKey, type Stamp } from './press-key';

export interface GaugeLabelProps {
  /** "Gauge at the wheel reads, psi" */
  label: string;
  /** A reading is wanted now. */
  isWanted: boolean;
  /** What a simulated gauge shows; a real one is read by the person. */
  shows?: string;
}

/** What the row of values stands for. */
export function GaugeLabel({ label, isWanted, shows }: GaugeLabelProps) {
  return (
    <h2 className="gauge-label" data-wanted={isWanted || undefined}>
      <span>{label}</span>
      {shows && <b className="gauge-shows">{shows}</b>}
    </h2>
  );
}

export interface GaugeKeysProps {
  values: readonly { key: string; text: string }[];
  onPick: (index: number, down: Stamp) => void;
  note?: string;
}

/** The offered values of a gauge, none emphasised. */
export function GaugeKeys({ values, onPick, note }: GaugeKeysProps) {
  return (
    <div className="gauge">
      <div className="key-row" data-count={values.length}>
        {values.map((value, index) => (
          // The place is the key: a value that changes must not move another button under a thumb.
          <PressKey key={value.key} className="key-value" onPress={(down) => onPick(index, down)}>
            {value.text}
          </PressKey>
        ))}
      </div>
      {note && <p className="gauge-note">{note}</p>}
    </div>
  );
}
