import { Box } from '@chakra-ui/react/box';
import { fitReportBody, fitVerdicts, type OutputOf, type ShelfKit } from '@windchest/contracts';
import { type ReactNode, useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { fitTexts as texts, verdictNotes, verdictTexts } from '../../config/texts/fit.js';
import { apiAddress } from '../../lib/api-address.js';
import { ApiFault } from '../../lib/api-fault.js';
import { showFieldFaults } from '../../lib/form-faults.js';
import { formResolver } from '../../lib/form-resolver.js';
import { sendPicture } from '../../lib/send-picture.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Fault } from '../../ui/fault.js';
import { Field } from '../../ui/field/field.js';
import { NumberField } from '../../ui/field/number-field.js';
import { RadioRow, RadioRows } from '../../ui/field/radio-rows.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextArea, TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Notice } from '../../ui/notice.js';
import { Text } from '../../ui/text.js';
import { usePrinters } from '../bench/use-printers.js';
import { fitWordNames, type FitWords, gapOf } from './fit-form.js';

const Row = ({ children }: { children: ReactNode }) => (
  <Box
    display="grid"
    gap="3"
    alignItems="start"
    gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
  >
    {children}
  </Box>
);

type Report = OutputOf<'POST /shelf/:slug/fit-reports'>;

/** How a part came out: what was printed, how it fits, a picture. */
export function ReportForm({ kit }: { kit: ShelfKit }) {
  const { chosen: card } = usePrinters();
  const [picture, setPicture] = useState<{ file: File | undefined; round: number }>({
    file: undefined,
    round: 0,
  });
  const pictureId = useId();
  const [isBesideField, setIsBesideField] = useState(false);
  const [isSent, setIsSent] = useState(false);
  const [pictureFault, setPictureFault] = useState<ApiFault>();
  const { run, fault, isRunning } = useAction('POST /shelf/:slug/fit-reports', []);
  const refresh = useAction('GET /shelf/:slug/fit-reports', ['GET /shelf/:slug/fit-reports']);
  const form = useForm<FitWords, unknown, FitWords>({
    defaultValues: {
      revisionId: (kit.held ?? kit.newest).id,
      partCode: '',
      clearance: null,
      printerName: card?.name ?? '',
      material: card?.materials[0]?.material ?? '',
      nozzleMm: card?.nozzleMm ?? 0.4,
      layerMm: 0.2,
      verdict: 'right',
      gapMm: null,
      words: '',
    },
    resolver: formResolver<FitWords, typeof fitReportBody>(fitReportBody),
  });
  const { register, formState } = form;
  const { errors } = formState;

  const addPicture = async ({ id }: Report): Promise<void> => {
    const { file } = picture;
    if (!file) return;
    await sendPicture(
      apiAddress('POST /fit-reports/:reportId/picture', { params: { reportId: id } }),
      file,
    ).catch((thrown: unknown) => {
      if (!(thrown instanceof ApiFault)) throw thrown;
      setPictureFault(thrown);
    });
    setPicture(({ round }) => ({ file: undefined, round: round + 1 }));
  };
  const send = form.handleSubmit(async (body) => {
    setIsSent(false);
    setPictureFault(undefined);
    const outcome = await run({ params: { slug: kit.slug }, body });
    if (!outcome.isDone) return setIsBesideField(showFieldFaults(outcome.fault, fitWordNames, form.setError));
    await addPicture(outcome.data);
    await refresh.run({ params: { slug: kit.slug } });
    setIsSent(true);
    form.reset({ ...body, partCode: '', verdict: 'right', gapMm: null, words: '' });
  });

  const held = kit.held !== null;
  const parts = kit.reprint.parts.filter(({ difference }) => !held || difference !== 'new');
  return (
    <Form onSubmit={send}>
      <Row>
        <SelectField
          label={texts.part}
          emptyLabel={texts.choosePart}
          error={errors.partCode}
          options={parts.map(({ code, name }) => ({ value: code, label: `${code} ${name}` }))}
          {...register('partCode')}
        />
        <SelectField
          label={texts.clearance}
          emptyLabel={texts.oneClearance}
          error={errors.clearance}
          options={Object.entries(texts.clearances).map(([value, label]) => ({ value, label }))}
          {...register('clearance', { setValueAs: (value: string | null) => value || null })}
        />
      </Row>
      <Row>
        <TextField
          label={texts.material}
          hint={texts.materialHint}
          error={errors.material}
          {...register('material')}
        />
        <TextField
          label={texts.printer}
          hint={texts.printerHint}
          isOptional
          error={errors.printerName}
          {...register('printerName')}
        />
      </Row>
      <Row>
        <NumberField
          label={texts.nozzle}
          unit="mm"
          error={errors.nozzleMm}
          {...register('nozzleMm', { valueAsNumber: true })}
        />
        <NumberField
          label={texts.layer}
          unit="mm"
          error={errors.layerMm}
          {...register('layerMm', { valueAsNumber: true })}
        />
      </Row>
      <RadioRows legend={texts.verdict} error={errors.verdict}>
        {fitVerdicts.map((verdict) => (
          <RadioRow
            key={verdict}
            value={verdict}
            label={verdictTexts[verdict]}
            note={verdictNotes[verdict]}
            {...register('verdict')}
          />
        ))}
      </RadioRows>
      <TextField
        label={texts.gap}
        hint={texts.gapHint}
        inputMode="decimal"
        isOptional
        error={errors.gapMm}
        {...register('gapMm', { setValueAs: (typed: string | null) => gapOf(String(typed ?? '')) })}
      />
      <TextArea
        label={texts.words}
        hint={texts.wordsHint}
        rows={4}
        isOptional
        error={errors.words}
        {...register('words')}
      />
      <Field id={pictureId} label={texts.picture} hint={texts.pictureHint} isOptional>
        {(aria) => (
          <input
            key={picture.round}
            type="file"
            accept="image/png,image/jpeg,image/webp"
            onChange={(event) => setPicture({ ...picture, file: event.target.files?.[0] })}
            {...aria}
          />
        )}
      </Field>
      <Text look="small" isSoft>
        {texts.caution}
      </Text>
      {fault && !isBesideField && <Fault what={texts.failed} fault={fault} />}
      {pictureFault && <Fault what={texts.pictureFailed} fault={pictureFault} />}
      <Button type="submit" isBusy={isRunning} busyWords={texts.sending}>
        {texts.send}
      </Button>
      {isSent && !formState.isDirty && (
        <Notice tone="ok" isNews>
          {texts.sent}
        </Notice>
      )}
    </Form>
  );
}
