import { Box } from '@chakra-ui/react/box';
import { mostCardMaterials } from '@windchest/contracts';
import { materials } from '@windchest/plates';
import { useId } from 'react';
import { type UseFormReturn, useFieldArray } from 'react-hook-form';
import { printerTexts as texts } from '../../config/texts/printer.js';
import { readAmount } from '../../lib/amount-text.js';
import { Button } from '../../ui/button.js';
import { FieldFault } from '../../ui/field/field.js';
import { TextField } from '../../ui/field/text-field.js';
import { Text } from '../../ui/text.js';
import { emptyMaterial, type PrinterForm } from './printer-form.js';

const known = Object.keys(materials);

export interface PrinterFilamentsProps {
  // The form hands out a checked body of another type; the field list does not care about it.
  form: UseFormReturn<PrinterForm, unknown, never>;
  currency: string;
}

/** What a printer is fed with, a row for each filament. */
export function PrinterFilaments({ form, currency }: PrinterFilamentsProps) {
  const { control, register, getValues, formState } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'materials' });
  const listId = useId();
  const faults = formState.errors.materials;
  /** The schema speaks of what is sent, so its fault bears the sent name. */
  const priceFault = (at: number): string | undefined => {
    const fault = (faults?.[at] as { pricePerKgMinor?: { message?: string } } | undefined)?.pricePerKgMinor;
    if (!fault) return undefined;
    const read = readAmount(getValues(`materials.${at}.price`), currency);
    return 'fault' in read ? read.fault : fault.message;
  };
  const listFault = faults?.root?.message ?? faults?.message;

  return (
    <Box role="group" aria-label={texts.filaments}>
      <Text fontSize="sm" fontWeight="semibold" aria-hidden>
        {texts.filaments}
      </Text>
      <Text look="small" isSoft>
        {texts.filamentsHint(known.join(', '))}
      </Text>
      <datalist id={listId}>
        {known.map((name) => (
          <option key={name} value={name} />
        ))}
      </datalist>
      {fields.map((field, at) => (
        <Box
          key={field.id}
          role="group"
          aria-label={texts.filamentOf(at + 1)}
          display="grid"
          gap="3"
          alignItems="start"
          paddingBlock="3"
          borderBottomWidth="1px"
          borderColor="hairline"
          gridTemplateColumns={{
            base: 'repeat(2, minmax(0, 1fr))',
            sm: 'minmax(0, 1fr) minmax(0, 1fr) auto',
          }}
        >
          <TextField
            label={texts.filament}
            list={listId}
            autoComplete="off"
            maxLength={40}
            error={faults?.[at]?.material}
            {...register(`materials.${at}.material`)}
          />
          <TextField
            label={texts.pricePerKg(currency)}
            inputMode="decimal"
            error={priceFault(at)}
            {...register(`materials.${at}.price`)}
          />
          {fields.length > 1 && (
            <Button
              look="plain"
              size="sm"
              marginTop={{ sm: '7' }}
              justifySelf="start"
              aria-label={texts.removeFilamentOf(at + 1)}
              onClick={() => remove(at)}
            >
              {texts.removeFilament}
            </Button>
          )}
        </Box>
      ))}
      {listFault && <FieldFault id={`${listId}-fault`}>{listFault}</FieldFault>}
      {fields.length < mostCardMaterials && (
        <Button look="outline" size="sm" marginTop="3" onClick={() => append(emptyMaterial)}>
          {texts.addFilament}
        </Button>
      )}
    </Box>
  );
}
