import type { Figure } from './result-words';

/** Figures as a list of definitions. */
export function ReviewFigures({ figures }: { figures: readonly Figure[] }) {
  return (
    <dl className="review-figures">
      {figures.map(({ name, value }) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
