import { Box } from '@chakra-ui/react/box';
import { printerCardBody, type PrinterCardFields } from '@windchest/contracts';
import { useForm, type UseFormReturn } from 'react-hook-form';
import { printerTexts as texts } from '../../config/texts/printer.js';
import { formResolver } from '../../lib/form-resolver.js';
import { keepPrinterCard } from '../../lib/printer-card.js';
import { useSession } from '../../lib/session.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { Fault } from '../../ui/fault.js';
import { Checkbox } from '../../ui/field/checkbox.js';
import { NumberField } from '../../ui/field/number-field.js';
import { SelectField } from '../../ui/field/select-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';
import { printerBodyOf, printerForm, type PrinterForm } from './printer-form.js';
import { PrinterFilaments } from './printer-filaments.js';
import { useKeepPrinter } from './use-keep-printer.js';
import { browserKey } from './use-printers.js';

const formId = 'printer-card';
const clearances = Object.entries(texts.clearances).map(([value, label]) => ({ value, label }));
const axes = ['x', 'y', 'z'] as const;

export interface PrinterCardDialogProps {
  /** Null writes a new one down. */
  card: (PrinterCardFields & { key: string; isMain?: boolean }) | null;
  /** There are others on the account, so that it can be said which is mostly printed on. */
  hasOthers?: boolean;
  onClose: () => void;
  onKept?: (key: string) => void;
}

/** A printer, written down or changed. */
export function PrinterCardDialog({ card, hasOthers, onClose, onKept }: PrinterCardDialogProps) {
  const { session, isSignedIn } = useSession();
  const currency = session?.workshop.currency ?? 'EUR';
  const { keep, fault, isRunning } = useKeepPrinter();
  const staysInBrowser = card ? card.key === browserKey : !isSignedIn;
  const form = useForm({
    defaultValues: printerForm(card, currency),
    resolver: formResolver<PrinterForm, typeof printerCardBody>(printerCardBody, printerBodyOf(currency)),
  });
  const { register, handleSubmit, formState } = form;
  const { errors } = formState;
  const save = handleSubmit(async (body) => {
    const key = await keep(body, card?.key ?? null);
    if (key === null) return;
    onKept?.(key);
    onClose();
  });
  const forget = () => {
    keepPrinterCard(null);
    onClose();
  };

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={card ? texts.change(card.name) : texts.title}
      actions={
        <>
          {card?.key === browserKey && (
            <Button look="plain" marginRight="auto" onClick={forget}>
              {texts.forget}
            </Button>
          )}
          <Button look="outline" onClick={onClose}>
            {texts.cancel}
          </Button>
          <Button type="submit" form={formId} isBusy={isRunning} busyWords={texts.keeping}>
            {texts.keep}
          </Button>
        </>
      }
    >
      <Text isSoft marginBottom="4">
        {staysInBrowser ? texts.whyBrowser : texts.whyAccount}
      </Text>
      <Form id={formId} onSubmit={save}>
        {fault && <Fault what={texts.failed} fault={fault} />}
        <TextField
          label={texts.name}
          maxLength={60}
          autoComplete="off"
          error={errors.name}
          {...register('name')}
        />
        <Box
          display="grid"
          gap="3"
          alignItems="start"
          gridTemplateColumns={{ base: 'repeat(2, minmax(0, 1fr))', sm: 'repeat(4, minmax(0, 1fr))' }}
        >
          {axes.map((axis) => (
            <NumberField
              key={axis}
              label={texts[axis]}
              unit="mm"
              error={errors.bed?.[`${axis}Mm`]}
              {...register(`bed.${axis}Mm`, { valueAsNumber: true })}
            />
          ))}
          <NumberField
            label={texts.nozzle}
            unit="mm"
            error={errors.nozzleMm}
            {...register('nozzleMm', { valueAsNumber: true })}
          />
        </Box>
        <PrinterFilaments form={form as UseFormReturn<PrinterForm, unknown, never>} currency={currency} />
        <SelectField
          label={texts.clearance}
          hint={texts.clearanceHint}
          emptyLabel={texts.clearanceOpen}
          options={clearances}
          error={errors.clearance}
          {...register('clearance')}
        />
        {!staysInBrowser && hasOthers && !card?.isMain && (
          <Checkbox label={texts.isMain} error={errors.isMain} {...register('isMain')} />
        )}
      </Form>
    </Dialog>
  );
}
