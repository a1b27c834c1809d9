import type { ReactNode } from 'react';
import type { NewFillEvent } from '~/fill/live-driver';
import type { Notice } from '~/fill/notice';
import type { Entered } from '~/fill/screen-ui';
import { PressKey, type Stamp } from './press-key';

export interface NoticeStripProps {
  entered: Entered | undefined;
  notice: Notice | undefined;
  /** The label of the gauge row: it stands in the same strip, so that the keys never move. */
  label: ReactNode;
  onTakeBack: (id: string) => void;
  onDone: (event: NewFillEvent, down: Stamp) => void;
  onDash: () => void;
}

/** The strip above the gauge row: what was just entered, a task in the cab, or a caution. */
export function NoticeStrip(props: NoticeStripProps) {
  const { entered, notice, label } = props;
  const kind = entered ? 'entered' : kindOf(notice);
  if (kind === 'none' && !label) return null;
  return (
    <div className="notice" data-kind={kind}>
      <div className="notice-words">
        {(entered || notice) && <p>{entered?.text ?? notice?.text}</p>}
        {label}
      </div>
      <StripKey {...props} />
    </div>
  );
}

function kindOf(notice: Notice | undefined) {
  if (!notice) return 'none';
  if (notice.done) return 'task';
  return notice.isHint ? 'hint' : 'caution';
}

function StripKey({ entered, notice, onTakeBack, onDone, onDash }: NoticeStripProps) {
  const id = entered?.id;
  if (id) return <PressKey onPress={() => onTakeBack(id)}>Take back</PressKey>;
  const done = entered ? undefined : notice?.done;
  if (!done) return null;
  return (
    <PressKey onPress={(down) => ('event' in done ? onDone(done.event, down) : onDash())}>
      {done.label}
    </PressKey>
  );
}
