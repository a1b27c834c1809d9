import type { ReactNode } from 'react';

export interface EmptyStateProps {
  title: string;
  /** What to do next. */
  children: ReactNode;
  /** Buttons and links that do it. */
  actions?: ReactNode;
}

/** What stands where nothing is yet: says what to do next. */
export function EmptyState({ title, children, actions }: EmptyStateProps) {
  return (
    <section className="empty">
      <h2>{title}</h2>
      <p>{children}</p>
      {actions && <div className="actions">{actions}</div>}
    </section>
  );
}
