import type { ReactNode } from 'react';

/** Says that something was kept, after the page has come back from it. */
export function Saved({ when, children }: { when: boolean; children: ReactNode }) {
  if (!when) return null;
  return (
    <p className="form-done" role="status">
      {children}
    </p>
  );
}
