/** The product's mark: a vessel, its level, and the line across it. */
export function Mark() {
  return (
    <svg viewBox="0 0 36 24" aria-hidden="true" focusable="false">
      <rect x="6" y="6" width="24" height="18" fill="var(--in)" />
      <path d="M6 0V22.75H30V0" fill="none" stroke="var(--ink)" strokeWidth="2.5" />
      <path d="M0 16H36" stroke="var(--paper)" strokeWidth="6.5" />
      <path d="M0 16H36" stroke="var(--ink)" strokeWidth="3.5" />
    </svg>
  );
}
