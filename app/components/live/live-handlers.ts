import type { Answer } from '~/fill/answers';
import type { NewFillEvent } from '~/fill/live-driver';
import type { MoreKey } from '~/fill/more-keys';
import type { KeypadFor } from '~/fill/screen-ui';
import type { Stamp } from './press-key';

/** What the keys of the live screen call. */
export interface LiveHandlers {
  pickOffered: (index: number, down: Stamp) => void;
  openKeypad: (reads: KeypadFor) => void;
  type: (text: string) => void;
  enter: (down: Stamp) => void;
  answer: (answer: Answer, down: Stamp) => void;
  record: (event: NewFillEvent, at: number) => void;
  acceptPedal: (event: NewFillEvent, at: number) => void;
  takeBack: (id: string) => void;
  openMore: () => void;
  more: (key: MoreKey, down: Stamp) => void;
  close: () => void;
  end: () => void;
}
