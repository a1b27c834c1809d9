import type { MoreGroup, MoreKey } from '~/fill/more-keys';
import { PressKey, type Stamp } from './press-key';

export interface MoreSheetProps {
  groups: readonly MoreGroup[];
  onPress: (key: MoreKey, down: Stamp) => void;
  onClose: () => void;
}

/** What is rarely needed, in place of vessel and keys; the call stays in sight. */
export function MoreSheet({ groups, onPress, onClose }: MoreSheetProps) {
  return (
    <div className="more">
      <div className="more-groups">
        {groups
          .filter((group) => group.keys.length > 0)
          .map((group) => (
            <section key={group.name} aria-label={group.name}>
              <h2>{group.name}</h2>
              <div className="key-row" data-count={Math.min(3, group.keys.length)}>
                {group.keys.map((key) => (
                  <PressKey
                    key={key.label}
                    aria-pressed={key.now}
                    onPress={(down) => onPress(key, down)}
                  >
                    {key.label}
                  </PressKey>
                ))}
              </div>
            </section>
          ))}
      </div>
      <PressKey className="key-answer" onPress={onClose}>
        Back
      </PressKey>
    </div>
  );
}
