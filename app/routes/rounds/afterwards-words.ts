import { cautionsAfter } from '~/components/caution-words';
import { type AfterwardsKey, afterwardsKeys } from '~/fill/wire';

/** The list of afterwards in words, by key; both lists stand in the order in which it is done. */
export const afterwardsWords = Object.fromEntries(
  afterwardsKeys.map((key, index) => [key, cautionsAfter[index]]),
) as Record<AfterwardsKey, string>;
