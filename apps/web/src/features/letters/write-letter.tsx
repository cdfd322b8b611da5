import { Box } from '@chakra-ui/react/box';
import { letterBody, type Letter, type LetterChoices } from '@windchest/contracts';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { letterFormTexts as texts, sendTexts } from '../../config/texts/workshop-letters.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { ConfirmDialog } from '../../ui/confirm-dialog.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import { Heading, Text } from '../../ui/text.js';
import { AudienceFields } from './audience-fields.js';
import { AudienceReach } from './audience-reach.js';
import { LetterFields } from './letter-fields.js';
import { bodyOf, emptyLetter, formOf, letterFieldNames, type LetterForm } from './letter-form.js';
import { LetterPreview } from './letter-preview.js';
import { SendLetter } from './send-letter.js';
import { letterAnswers } from './stale-answers.js';

/** A draft: its words, its audience beside whom that is, what each reader gets, and letting it go. */
export function WriteLetter({ letter, choices }: { letter: Letter | null; choices: LetterChoices }) {
  const { may } = useSession();
  const navigate = useNavigate();
  const draft = useAction('POST /workshop/letters', letterAnswers);
  const change = useAction('PUT /workshop/letters/:letterId', letterAnswers);
  const remove = useAction('DELETE /workshop/letters/:letterId', ['GET /workshop/letters']);
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const [isSaved, setIsSaved] = useState(false);
  const [isDeleting, setIsDeleting] = useState(false);
  const [reader, setReader] = useState<string>();
  const [size, setSize] = useState<number>();
  const form = useForm<LetterForm, unknown, LetterForm>({
    defaultValues: letter ? formOf(letter) : emptyLetter(choices.perMinute),
    resolver: formResolver<LetterForm, typeof letterBody>(letterBody, bodyOf),
  });
  const written = useWatch({ control: form.control }) as LetterForm;
  const { isDirty } = form.formState;
  const isWritable = may('letters:write');
  const save = form.handleSubmit(async (body) => {
    const outcome = letter
      ? await change.run({ params: { letterId: letter.id }, body })
      : await draft.run({ body });
    setIsSaved(outcome.isDone);
    if (!outcome.isDone)
      return setIsFaultBesideField(showFieldFaults(outcome.fault, letterFieldNames, form.setError));
    if (!letter) return navigate(paths.workshop.letter.to({ letterId: outcome.data.id }));
    form.reset(formOf(outcome.data));
  });
  const fault = draft.fault ?? change.fault;
  return (
    <>
      <Form onSubmit={save} gap="6">
        <LetterFields form={form} choices={choices} />
        <Box
          display="grid"
          columnGap="10"
          rowGap="6"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'repeat(2, minmax(0, 1fr))' }}
          borderTopWidth="1px"
          borderColor="hairline"
          paddingTop="5"
        >
          <Box>
            <Heading level={2} marginBottom="4">
              {texts.audience}
            </Heading>
            <AudienceFields form={form} choices={choices} />
          </Box>
          <AudienceReach form={written} onPreview={letter ? setReader : undefined} onCounted={setSize} />
        </Box>
        {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
        {isWritable && (
          <Box display="flex" flexWrap="wrap" alignItems="center" gap="3">
            <Button
              type="submit"
              look={letter ? 'outline' : 'ink'}
              isBusy={draft.isRunning || change.isRunning}
              busyWords={texts.saving}
            >
              {letter ? texts.save : texts.draft}
            </Button>
            {letter && may('letters:send') && <SendLetter letter={letter} size={size} isDirty={isDirty} />}
            {letter && (
              <Button type="button" look="plain" onClick={() => setIsDeleting(true)}>
                {texts.delete}
              </Button>
            )}
            <Box role="status" fontSize="sm" color="ink.soft">
              {isSaved && !isDirty ? texts.saved : ''}
            </Box>
            {letter && !may('letters:send') && (
              <Text look="small" isSoft>
                {sendTexts.mayNot}
              </Text>
            )}
          </Box>
        )}
      </Form>
      {letter && (
        <Box marginTop="8" paddingTop="6" borderTopWidth="1px" borderColor="hairline" maxWidth="46rem">
          <LetterPreview
            letterId={letter.id}
            savedAt={letter.updatedAt}
            reader={reader}
            isDirty={isDirty}
            mayTest={isWritable}
          />
        </Box>
      )}
      {letter && (
        <ConfirmDialog
          isOpen={isDeleting}
          onClose={() => setIsDeleting(false)}
          title={texts.deleteAsk(letter.subject)}
          confirmLabel={texts.delete}
          onConfirm={async () => {
            const { isDone } = await remove.run({ params: { letterId: letter.id } });
            if (isDone) void navigate(paths.workshop.letters.to());
            return isDone;
          }}
        >
          <Text>{texts.deleteWhat}</Text>
          {remove.fault && <Fault fault={remove.fault} />}
        </ConfirmDialog>
      )}
    </>
  );
}
