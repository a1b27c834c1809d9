/** A person's choice between day and dusk; without one the system's setting decides. */
export type Theme = 'day' | 'dusk';

/** Reads the `theme` cookie that the switch on the screen sets. */
export function readTheme(request: Request): Theme | null {
  const match = /(?:^|;\s*)theme=(day|dusk)\b/.exec(request.headers.get('Cookie') ?? '');
  return (match?.[1] as Theme | undefined) ?? null;
}
