import { newsEndpoints } from '@windchest/contracts';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { paths } from '../../config/paths.js';
import { newsTexts as texts } from '../../config/texts/letters.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { Box } from '@chakra-ui/react/box';

/** Asks for news by e-mail; they come once the mailed link was pressed. */
export function NewsPage() {
  const [askedFor, setAskedFor] = useState<string>();
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: formResolver(newsEndpoints['POST /news'].body),
    defaultValues: { email: '' },
  });
  const { run, fault, isRunning, reset } = useAction('POST /news');
  const ask = handleSubmit(async (body) => {
    const outcome = await run({ body });
    if (outcome.isDone) setAskedFor(body.email);
    else if (showFieldFaults(outcome.fault, ['email'], setError)) reset();
  });
  return (
    <Band tone="sheet">
      <PageTitle title={texts.title} />
      <Heading level={1}>{texts.title}</Heading>
      <Text look="lead" marginTop="2">
        {texts.lead}
      </Text>
      <Box marginTop="7" maxWidth="narrow">
        {askedFor ? (
          <Box role="status">
            <Heading level={2}>{texts.asked}</Heading>
            <Text marginTop="1" marginBottom="5" overflowWrap="anywhere">
              {texts.askedDetail(askedFor)}
            </Text>
            <Button look="outline" onClick={() => setAskedFor(undefined)}>
              {texts.again}
            </Button>
          </Box>
        ) : (
          <Form onSubmit={ask}>
            <TextField
              label={texts.email}
              type="email"
              autoComplete="email"
              error={formState.errors.email}
              {...register('email')}
            />
            {fault && <Fault what={texts.failed} fault={fault} />}
            <Button type="submit" isBusy={isRunning}>
              {texts.ask}
            </Button>
            <Text look="small" isSoft>
              {texts.stops}
            </Text>
          </Form>
        )}
        <Text marginTop="8">
          <TextLink to={paths.letters.to()}>{texts.archive}</TextLink>
        </Text>
      </Box>
    </Band>
  );
}
