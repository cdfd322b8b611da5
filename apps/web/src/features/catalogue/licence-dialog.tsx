import { Box } from '@chakra-ui/react/box';
import { type Licence, licenceBody } from '@windchest/contracts';
import { useForm } from 'react-hook-form';
import { savingTexts } from '../../config/texts/workshop-forms.js';
import { licenceTexts as texts } from '../../config/texts/workshop-kits.js';
import { readAmount } from '../../lib/amount-text.js';
import { formResolver } from '../../lib/form-resolver.js';
import { useAction } from '../../lib/use-action.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { NumberField } from '../../ui/field/number-field.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextArea, TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { licenceBodyOf, type LicenceForm, licenceForm } from './licence-form.js';

const formId = 'licence-form';
const stale = [
  'GET /workshop/kits/:kitId',
  'GET /workshop/kits',
  'GET /workshop/revisions/:revisionId',
] as const;

export interface LicenceDialogProps {
  kitId: string;
  currency: string;
  /** Null adds one. */
  licence: (Licence & { isOffered: boolean }) | null;
  onClose: () => void;
}

/** Offers a licence, or changes one. */
export function LicenceDialog({ kitId, currency, licence, onClose }: LicenceDialogProps) {
  const adding = useAction('POST /workshop/kits/:kitId/licences', stale);
  const changing = useAction('PUT /workshop/kits/:kitId/licences/:licenceId', stale);
  const fault = adding.fault ?? changing.fault;
  const { register, handleSubmit, getValues, formState } = useForm({
    defaultValues: licenceForm(licence),
    resolver: formResolver<LicenceForm, typeof licenceBody>(licenceBody, licenceBodyOf(currency)),
  });
  const { errors } = formState as { errors: typeof formState.errors & { priceMinor?: { message?: string } } };
  const priceFault = () => {
    if (!errors.priceMinor) return undefined;
    const read = readAmount(getValues('price'), currency);
    return 'fault' in read ? read.fault : errors.priceMinor.message;
  };
  const save = handleSubmit(async (body) => {
    const outcome = licence
      ? await changing.run({ params: { kitId, licenceId: licence.id }, body })
      : await adding.run({ params: { kitId }, body });
    if (outcome.isDone) onClose();
  });
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={licence ? texts.editTitle(licence.name) : texts.addTitle}
      actions={
        <>
          <Button look="outline" onClick={onClose}>
            {savingTexts.cancel}
          </Button>
          <Button
            type="submit"
            form={formId}
            isBusy={adding.isRunning || changing.isRunning}
            busyWords={savingTexts.saving}
          >
            {licence ? texts.save : texts.add}
          </Button>
        </>
      }
    >
      <Form id={formId} onSubmit={save}>
        {fault && <Fault what={texts.failed} fault={fault} />}
        <SelectField
          label={texts.kind}
          options={Object.entries(texts.kinds).map(([value, label]) => ({ value, label }))}
          error={errors.kind}
          {...register('kind')}
        />
        <TextField label={texts.name} hint={texts.nameHint} error={errors.name} {...register('name')} />
        <TextArea
          label={texts.terms}
          hint={texts.termsHint}
          rows={4}
          error={errors.terms}
          {...register('terms')}
        />
        <Box
          display="grid"
          gap="3"
          alignItems="end"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
        >
          <TextField
            label={texts.price(currency)}
            hint={texts.priceHint}
            inputMode="decimal"
            error={priceFault()}
            {...register('price')}
          />
          <NumberField
            label={texts.yearlyLimit}
            hint={texts.yearlyLimitHint}
            step={1}
            error={errors.yearlyLimit}
            {...register('yearlyLimit', { valueAsNumber: true })}
          />
        </Box>
        <Checkbox label={texts.isOffered} {...register('isOffered')} />
      </Form>
    </Dialog>
  );
}
