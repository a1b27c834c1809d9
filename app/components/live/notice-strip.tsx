import type { NewFillEvent } from '~/fill/live-driver';
import type { Notice } from '~/fill/notice';
import type { Entered } from '~/fill/screen-ui';
import { PressKey, type Stamp } from './press-key';

export interface NoticeStripProps {
  entered: Entered | undefined;
  notice: Notice | undefined;
  onTakeBack: (id: string) => void;
  onDone: (event: NewFillEvent, down: Stamp) => void;
  onDash: () => void;
}

/** The line above the gauge row: what was just entered, a task in the cab, or a caution. */
export function NoticeStrip({ entered, notice, onTakeBack, onDone, onDash }: NoticeStripProps) {
  if (entered) {
    const { id, text } = entered;
    return (
      <div className="notice" data-kind="entered">
        <p>{text}</p>
        {id && <PressKey onPress={() => onTakeBack(id)}>Take back</PressKey>}
      </div>
    );
  }
  if (!notice) return null;
  const { text, done } = notice;
  return (
    <div className="notice" data-kind={done ? 'task' : 'caution'}>
      <p>{text}</p>
      {done && (
        <PressKey onPress={(down) => ('event' in done ? onDone(done.event, down) : onDash())}>
          {done.label}
        </PressKey>
      )}
    </div>
  );
}
