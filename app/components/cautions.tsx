export interface CautionsProps {
  items: readonly string[];
  /** For a screen reader; the page has its own heading. */
  label?: string;
}

/** Safety words as a list. The words themselves stand in `caution-words.ts`. */
export function Cautions({ items, label }: CautionsProps) {
  return (
    <ul className="cautions" aria-label={label}>
      {items.map((item) => (
        <li key={item}>{item}</li>
      ))}
    </ul>
  );
}
