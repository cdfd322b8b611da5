import { Box } from '@chakra-ui/react/box';
import { settleBody, type UnclearLocation } from '@windchest/contracts';
import { useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import { useParams } from 'react-router-dom';
import type { z } from 'zod';
import { paths } from '../../config/paths.js';
import { locationsTexts as texts } from '../../config/texts/workshop-ledger.js';
import { date, price } from '../../lib/format.js';
import { countryName } from '../../lib/workshop-format.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextArea } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { TextLink } from '../../ui/link.js';
import { Notice } from '../../ui/notice.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { countryOptions } from '../basket/country-options.js';

type Fields = z.input<typeof settleBody>;

function SettleForm({ location }: { location: UnclearLocation }) {
  const { session } = useSession();
  const [isSaved, setIsSaved] = useState(false);
  const { run, fault } = useAction('POST /workshop/ledger/locations/:receiptId', [
    'GET /workshop/ledger/locations',
    'GET /workshop/ledger/locations/:receiptId',
    'GET /workshop/ledger/quarters/:year/:quarter',
    'GET /workshop/orders/:orderId',
  ]);
  const { register, handleSubmit, setError, formState } = useForm<
    Fields,
    unknown,
    z.output<typeof settleBody>
  >({
    defaultValues: { country: location.settled?.country ?? '', reason: location.settled?.reason ?? '' },
    resolver: formResolver<Fields, typeof settleBody>(settleBody),
  });
  const { errors, isSubmitting, isDirty } = formState;
  const countries = useMemo(() => {
    const known = [location.declared, location.billing, location.card].filter((code) => code !== null);
    const all = countryOptions(session?.workshop.locale ?? 'en-GB', {
      languages: [],
      workshopCountry: undefined,
    });
    // What the evidence names comes first.
    const first = [...new Set(known)].flatMap((code) => all.find(({ value }) => value === code) ?? []);
    return [...first, ...all.filter((one) => !first.includes(one))];
  }, [session, location]);
  const save = handleSubmit(async (body) => {
    const outcome = await run({ params: { receiptId: location.receiptId }, body });
    setIsSaved(outcome.isDone);
    if (!outcome.isDone) showFieldFaults(outcome.fault, ['country', 'reason'], setError);
  });
  return (
    <Form onSubmit={save}>
      <SelectField
        label={texts.country}
        emptyLabel={texts.countryEmpty}
        options={countries}
        error={errors.country}
        {...register('country')}
      />
      <TextArea
        label={texts.reason}
        hint={texts.reasonHint}
        rows={3}
        maxLength={500}
        error={errors.reason}
        {...register('reason')}
      />
      {fault && <Fault what={texts.failed} fault={fault} />}
      <Box display="flex" alignItems="center" gap="4">
        <Button type="submit" isBusy={isSubmitting} busyWords={texts.saving}>
          {texts.save}
        </Button>
        <Box role="status" fontSize="sm" color="ink.soft">
          {isSaved && !isDirty ? texts.saved : ''}
        </Box>
      </Box>
    </Form>
  );
}

const Evidence = ({ location }: { location: UnclearLocation }) => (
  <Box as="section" marginTop="8" maxWidth="measure">
    <Heading level={2} look="subsection" marginBottom="2">
      {texts.evidence}
    </Heading>
    <Box as="dl">
      {(
        [
          [texts.declared, location.declared],
          [texts.billing, location.billing],
          [texts.card, location.card],
        ] as const
      ).map(([name, code]) => (
        <Box
          key={name}
          display="flex"
          justifyContent="space-between"
          gap="6"
          paddingBlock="2"
          borderBottomWidth="1px"
          borderColor="hairline"
        >
          <Box as="dt" color="ink.soft">
            {name}
          </Box>
          <Box as="dd" fontWeight="semibold">
            {code ? countryName(code) : texts.unknown}
          </Box>
        </Box>
      ))}
    </Box>
    <Text look="small" isSoft marginTop="4">
      {texts.rule}
    </Text>
    <Text look="small" isSoft marginTop="2">
      {texts.stays}
    </Text>
  </Box>
);

/** One receipt: what is known of where its buyer is, and where it counts. */
export function LocationPage() {
  const { receiptId = '' } = useParams();
  const { may } = useSession();
  const { data, fault, mutate } = useEndpoint('GET /workshop/ledger/locations/:receiptId', {
    params: { receiptId },
  });
  if (!data)
    return (
      <Band>
        {fault ? (
          <Fault what={texts.notFound} fault={fault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  const { settled } = data;
  return (
    <>
      <PageTitle title={texts.heading(data.receiptNumber)} />
      <SplitSheet
        asideLabel={texts.settle}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.locations.to()}>{texts.title}</TextLink>
            </Text>
            <Heading level={1}>{texts.heading(data.receiptNumber)}</Heading>
            <Evidence location={data} />
          </>
        }
        aside={
          <>
            <Heading level={2} look="subsection" marginBottom="4">
              {texts.settle}
            </Heading>
            {settled && (
              <Box marginBottom="5">
                <Notice
                  tone="ok"
                  title={texts.wasSettled(countryName(settled.country), settled.who, date(settled.at))}
                >
                  {settled.reason}
                </Notice>
              </Box>
            )}
            {data.isQuarterClosed ? (
              <Text>{texts.quarterClosed}</Text>
            ) : (
              may('tax:write') && <SettleForm key={settled?.at ?? ''} location={data} />
            )}
          </>
        }
        block={
          <TitleBlock
            columns={2}
            fields={[
              { name: texts.columns.issued, value: date(data.issuedAt) },
              {
                name: texts.order,
                value: (
                  <TextLink to={paths.workshop.order.to({ orderId: data.orderId })}>
                    {data.orderNumber}
                  </TextLink>
                ),
              },
              { name: texts.counts, value: texts.rate(countryName(data.country), data.ratePercent) },
              { name: texts.columns.buyer, value: data.email },
            ]}
            summary={{ name: texts.columns.total, value: price(data.total) }}
          />
        }
      />
    </>
  );
}
