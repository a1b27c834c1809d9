import type { EntryUse, ReviewEntry } from './review-model';

/** A line for everything about the record that the result leaves out. */
export function notesOf(entries: readonly ReviewEntry[], overlapping: boolean): string[] {
  const count = (use: EntryUse) => entries.filter((entry) => entry.use === use).length;
  return [
    overlapping
      ? 'Another fill of this coach was open at the same time. Nothing is learned from this one.'
      : '',
    endsWords(count('already-ended')),
    lateWords(count('after-end')),
    takenBackWords(count('taken-back')),
  ].filter((note) => note !== '');
}

function endsWords(count: number): string {
  if (count === 0) return '';
  if (count === 1) return 'It had already ended when it was ended again. The first end counts.';
  return `It had already ended when it was ended again, ${count} times. The first end counts.`;
}

function lateWords(count: number): string {
  if (count === 0) return '';
  if (count === 1) return 'One event came after the end. It is kept in the table and not used.';
  return `${count} events came after the end. They are kept in the table and not used.`;
}

function takenBackWords(count: number): string {
  if (count === 0) return '';
  if (count === 1) return 'One entry was taken back and does not count.';
  return `${count} entries were taken back and do not count.`;
}
