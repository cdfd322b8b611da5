import { Box } from '@chakra-ui/react/box';
import { kitBody } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { kitFormTexts, newKitTexts as texts } from '../../config/texts/workshop-kits.js';
import { formResolver } from '../../lib/form-resolver.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Form } from '../../ui/form.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { kitWordNames, type KitWords, KitWordsFields } from './kit-words-fields.js';

const emptyKit: KitWords = { name: '', slug: '', tagline: '', description: '', colour: 'orange' };

/** The first words of a kit; the rest stands on its own page. */
export function NewKitPage() {
  const navigate = useNavigate();
  const { run, fault, isRunning } = useAction('POST /workshop/kits', ['GET /workshop/kits']);
  const [isFaultBesideField, setIsFaultBesideField] = useState(false);
  const form = useForm<KitWords, unknown, KitWords>({
    defaultValues: emptyKit,
    resolver: formResolver<KitWords, typeof kitBody>(kitBody),
  });
  const save = form.handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) return navigate(paths.workshop.kit.to({ kitId: outcome.data.id }));
    setIsFaultBesideField(showFieldFaults(outcome.fault, kitWordNames, form.setError));
  });
  return (
    <Band>
      <PageTitle title={texts.title} />
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2" marginBottom="6">
        {texts.lead}
      </Text>
      <Box maxWidth="62rem">
        <Form onSubmit={save}>
          <KitWordsFields form={form} isSlugFollowing />
          {fault && !isFaultBesideField && <Fault what={kitFormTexts.failed} fault={fault} />}
          <Button type="submit" isBusy={isRunning} busyWords={savingTexts.saving}>
            {kitFormTexts.draft}
          </Button>
        </Form>
      </Box>
    </Band>
  );
}
