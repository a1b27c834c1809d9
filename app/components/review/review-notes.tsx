import { notesOf } from './note-words';
import type { ReviewEntry } from './review-model';

interface ReviewNotesProps {
  entries: readonly ReviewEntry[];
  overlapping: boolean;
}

/** What of the record did not count, and why. */
export function ReviewNotes({ entries, overlapping }: ReviewNotesProps) {
  const notes = notesOf(entries, overlapping);
  if (notes.length === 0) return null;
  return (
    <ul className="review-notes" aria-label="Not used">
      {notes.map((note) => (
        <li key={note}>{note}</li>
      ))}
    </ul>
  );
}
