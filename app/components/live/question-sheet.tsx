import { cautionDrain, cautionsPedal } from '~/components/caution-words';
import type { NewFillEvent } from '~/fill/live-driver';
import type { Question } from '~/fill/screen-ui';
import { PressKey } from './press-key';

export interface QuestionSheetProps {
  question: Question;
  onRecord: (event: NewFillEvent, at: number) => void;
  onAcceptPedal: (event: NewFillEvent, at: number) => void;
  onEnd: () => void;
  onClose: () => void;
}

/** Asks once, in place of the keys. Nothing is refused and nothing is changed here. */
export function QuestionSheet(props: QuestionSheetProps) {
  const { question, onClose } = props;
  return (
    <div className="question" role="alertdialog" aria-label="A question">
      <QuestionWords question={question} />
      <div className="key-row" data-count="1">
        <YesKeys {...props} />
        <PressKey className="key-answer" onPress={onClose}>
          {question.kind === 'end' ? 'No, go on' : 'Neither, go back'}
        </PressKey>
      </div>
    </div>
  );
}

function QuestionWords({ question }: { question: Question }) {
  switch (question.kind) {
    case 'far':
      return (
        <p>
          <b>{question.shown}</b> is far from what is likely now, about {question.expected}. Does
          the gauge show it?
        </p>
      );
    case 'which':
      return <p>The values changed just before you tapped. Which one do you mean?</p>;
    case 'pedal':
      return <PedalCautions />;
    case 'end':
      return <p>End this fill? It can’t be taken up again.</p>;
  }
}

function YesKeys({ question, onRecord, onAcceptPedal, onEnd }: QuestionSheetProps) {
  switch (question.kind) {
    case 'far':
      return (
        <PressKey
          className="key-answer key-ink"
          onPress={() => onRecord(question.event, question.at)}
        >
          Yes, {question.shown}
        </PressKey>
      );
    case 'which':
      return question.choices.map(({ event, shown }) => (
        <PressKey key={shown} className="key-answer" onPress={() => onRecord(event, question.at)}>
          {shown}
        </PressKey>
      ));
    case 'pedal':
      return (
        <PressKey
          className="key-answer key-ink"
          onPress={() => onAcceptPedal(question.event, question.at)}
        >
          I have read this
        </PressKey>
      );
    case 'end':
      return (
        <PressKey className="key-answer key-ink" onPress={onEnd}>
          Yes, end it
        </PressKey>
      );
  }
}

/** What has to be read before the pedal is used. */
export function PedalCautions() {
  return (
    <div className="pedal-cautions">
      {cautionsPedal.map((words) => (
        <p key={words}>{words}</p>
      ))}
      <p>{cautionDrain}</p>
    </div>
  );
}
