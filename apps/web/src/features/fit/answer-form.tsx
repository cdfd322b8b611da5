import { useState } from 'react';
import { fitReportTexts as texts } from '../../config/texts/workshop-fit.js';
import { useAction } from '../../lib/use-action.js';
import { useDraftText } from '../../lib/use-draft-text.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextArea } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';

/** Writes the reporter an answer; what is typed is kept in the browser until it is sent. */
export function AnswerForm({ reportId }: { reportId: string }) {
  const draft = useDraftText(`fit.${reportId}`, '');
  const [isTried, setIsTried] = useState(false);
  const { run, fault, isRunning } = useAction('POST /workshop/fit-reports/:reportId/answers', [
    'GET /workshop/fit-reports/:reportId',
    'GET /workshop/fit-reports',
  ]);
  const isEmpty = draft.text.trim() === '';
  const send = async () => {
    setIsTried(true);
    if (isEmpty) return;
    const { isDone } = await run({ params: { reportId }, body: { text: draft.text } });
    if (!isDone) return;
    draft.forget();
    setIsTried(false);
  };
  return (
    <Form
      marginTop="6"
      maxWidth="measure"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <TextArea
        label={texts.answer}
        hint={texts.answerHint}
        rows={5}
        maxLength={4000}
        value={draft.text}
        error={isTried && isEmpty ? texts.noAnswers : undefined}
        onChange={(event) => draft.write(event.target.value)}
      />
      {fault && <Fault what={texts.failed} fault={fault} />}
      <Button type="submit" isBusy={isRunning} busyWords={texts.sending}>
        {texts.send}
      </Button>
    </Form>
  );
}
