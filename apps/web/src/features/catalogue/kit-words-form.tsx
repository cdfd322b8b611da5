import { Box } from '@chakra-ui/react/box';
import { kitBody, type WorkshopKit } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { kitFormTexts as texts, kitTexts } from '../../config/texts/workshop-kits.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import type { DrawnVoice } from '../../ui/drawing/rank-layout.js';
import { kitWordNames, type KitWords, KitWordsFields } from './kit-words-fields.js';

const wordsOf = ({ name, slug, tagline, description, colour }: WorkshopKit): KitWords => ({
  name,
  slug,
  tagline,
  description,
  colour,
});

/** Changes a kit's words and colour. */
export function KitWordsForm({ kit, voices }: { kit: WorkshopKit; voices: readonly DrawnVoice[] }) {
  const { run, fault, isRunning } = useAction('PATCH /workshop/kits/:kitId', [
    'GET /workshop/kits/:kitId',
    'GET /workshop/kits',
  ]);
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const form = useForm<KitWords, unknown, KitWords>({
    defaultValues: wordsOf(kit),
    resolver: formResolver<KitWords, typeof kitBody>(kitBody),
  });
  const [isSaved, setIsSaved] = useState(false);
  const { isDirty } = form.formState;
  const save = form.handleSubmit(async (body) => {
    const outcome = await run({ params: { kitId: kit.id }, body });
    setIsSaved(outcome.isDone);
    if (outcome.isDone) form.reset(wordsOf(outcome.data));
    else setIsFaultBesideField(showFieldFaults(outcome.fault, kitWordNames, form.setError));
  });
  return (
    <Form onSubmit={save}>
      <KitWordsFields form={form} voices={voices} />
      {fault && !isFaultBesideField && <Fault what={texts.failed} fault={fault} />}
      <Box display="flex" flexWrap="wrap" alignItems="center" gap="4">
        <Button type="submit" isBusy={isRunning} busyWords={savingTexts.saving}>
          {texts.save}
        </Button>
        <Box role="status" fontSize="sm" color="ink.soft">
          {isSaved && !isDirty ? kitTexts.saved : ''}
        </Box>
      </Box>
    </Form>
  );
}
