import type { PressureUnit } from '~/units';
import { resultFigures, resultSentence } from './result-words';
import { ReviewFigures } from './review-figures';
import type { ReviewResult } from './review-model';

/** What the fill came to: a sentence, the figures, and what they were computed from. */
export function ReviewOutcome({ result, unit }: { result: ReviewResult; unit: PressureUnit }) {
  return (
    <section className="grid gap-6" aria-label="Result">
      <p className="review-result">{resultSentence(result, unit)}</p>
      <ReviewFigures figures={resultFigures(result, unit)} />
      <p className="quiet text-base">
        Worked out by engine version {result.engineVersion} from the record up to number{' '}
        {result.lastSeq}.
      </p>
    </section>
  );
}
