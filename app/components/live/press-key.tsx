import { type ComponentProps, createContext, use, useRef } from 'react';

/** When a key went down: seconds since the fill's start, and on a running clock. */
export interface Stamp {
  at: number;
  clock: number;
}

export interface PressClock {
  stamp: () => Stamp;
  /** While a thumb is down no offered value may change. */
  pressing: (down: boolean) => void;
}

export const PressClockContext = createContext<PressClock>({
  stamp: () => ({ at: 0, clock: 0 }),
  pressing: () => undefined,
});

export interface PressKeyProps extends Omit<ComponentProps<'button'>, 'onClick'> {
  /** Called on release, with the time of the press-down. Sliding off cancels. */
  onPress: (down: Stamp) => void;
}

/**
 * A key of the live screen. The browser's own click gives release and slide-off; what is recorded
 * is the moment the thumb went down. A keyboard's press has no such moment, so it counts as now.
 */
export function PressKey({ onPress, className = '', ...rest }: PressKeyProps) {
  const clock = use(PressClockContext);
  const down = useRef<Stamp>(undefined);
  const lift = () => clock.pressing(false);
  return (
    <button
      type="button"
      className={`key ${className}`}
      onPointerDown={() => {
        down.current = clock.stamp();
        clock.pressing(true);
      }}
      onPointerUp={lift}
      onPointerCancel={lift}
      onPointerLeave={lift}
      onClick={(event) => {
        // detail 0 is a keyboard or a screen reader: an older press-down is not this press.
        const stamp = event.detail === 0 ? undefined : down.current;
        down.current = undefined;
        lift();
        onPress(stamp ?? clock.stamp());
      }}
      {...rest}
    />
  );
}
