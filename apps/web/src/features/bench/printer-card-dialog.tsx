import { Box } from '@chakra-ui/react/box';
import { useForm } from 'react-hook-form';
import { printerTexts } from '../../config/texts/printer.js';
import { type PrinterCard, usePrinterCard } from '../../lib/printer-card.js';
import { Button } from '../../ui/button.js';
import { Dialog } from '../../ui/dialog.js';
import { NumberField } from '../../ui/field/number-field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Form } from '../../ui/form.js';
import { Text } from '../../ui/text.js';

const formId = 'printer-card';

/** A length in mm as the printer card bears it. */
const lengthUpTo = (most: number) => ({
  valueAsNumber: true as const,
  validate: (value: number) => (value > 0 && value <= most) || printerTexts.lengthRefused(most),
});

const emptyCard = {
  bed: { xMm: NaN, yMm: NaN, zMm: NaN },
  nozzleMm: 0.4,
  material: '',
  pricePerKgMinor: null,
};

/** Typed in by a visitor, kept in the browser. */
export function PrinterCardDialog({ onClose }: { onClose: () => void }) {
  const [card, keep] = usePrinterCard();
  const { register, handleSubmit, formState } = useForm<PrinterCard>({ defaultValues: card ?? emptyCard });
  const { errors } = formState;
  const save = (next: PrinterCard) => {
    keep(next);
    onClose();
  };
  const forget = () => {
    keep(null);
    onClose();
  };

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={printerTexts.title}
      actions={
        <>
          {card && (
            <Button look="plain" marginRight="auto" onClick={forget}>
              {printerTexts.forget}
            </Button>
          )}
          <Button look="outline" onClick={onClose}>
            {printerTexts.cancel}
          </Button>
          <Button type="submit" form={formId}>
            {printerTexts.keep}
          </Button>
        </>
      }
    >
      <Text isSoft marginBottom="4">
        {printerTexts.why}
      </Text>
      <Form id={formId} onSubmit={handleSubmit(save)}>
        <Box display="grid" gap="3" gridTemplateColumns={{ base: '1fr', sm: 'repeat(3, minmax(0, 1fr))' }}>
          <NumberField
            label={printerTexts.x}
            unit="mm"
            error={errors.bed?.xMm}
            {...register('bed.xMm', lengthUpTo(2000))}
          />
          <NumberField
            label={printerTexts.y}
            unit="mm"
            error={errors.bed?.yMm}
            {...register('bed.yMm', lengthUpTo(2000))}
          />
          <NumberField
            label={printerTexts.z}
            unit="mm"
            error={errors.bed?.zMm}
            {...register('bed.zMm', lengthUpTo(3000))}
          />
        </Box>
        <Box display="grid" gap="3" gridTemplateColumns={{ base: '1fr', sm: '1fr 2fr' }}>
          <NumberField
            label={printerTexts.nozzle}
            unit="mm"
            error={errors.nozzleMm}
            {...register('nozzleMm', lengthUpTo(2))}
          />
          <TextField
            label={printerTexts.material}
            placeholder={printerTexts.materialHint}
            error={errors.material}
            maxLength={40}
            {...register('material', {
              validate: (value) => value.trim() !== '' || printerTexts.materialRefused,
            })}
          />
        </Box>
      </Form>
    </Dialog>
  );
}
