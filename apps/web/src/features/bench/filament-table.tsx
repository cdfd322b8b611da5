import { Box } from '@chakra-ui/react/box';
import type { PrinterCardFields } from '@windchest/contracts';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { grams, number, price } from '../../lib/format.js';
import { SelectField, type SelectOption } from '../../ui/field/select-field.js';
import { type Column, HairlineTable } from '../../ui/table/hairline-table.js';
import { Unbroken } from '../../ui/unbroken.js';
import { type FilamentNeed, sumOf } from './plan-figures.js';

export const spoolSizesG = [1000, 750] as const;
export type SpoolSizeG = (typeof spoolSizesG)[number];

/** The maker's own material first, then what the card has. */
function optionsOf({ makers }: FilamentNeed, card: PrinterCardFields['materials']): SelectOption[] {
  const onCard = card.map(({ material }) => material);
  const hasMakers = onCard.some((one) => one.toLowerCase() === makers.toLowerCase());
  return [
    ...(hasMakers ? [] : [{ value: makers, label: texts.notOnCard(makers) }]),
    ...onCard.map((material) => ({ value: material, label: material })),
  ];
}

export interface FilamentTableProps {
  needs: readonly FilamentNeed[];
  card: PrinterCardFields['materials'];
  currency: string;
  spoolG: SpoolSizeG;
  onSpool: (spoolG: SpoolSizeG) => void;
  /** Prints in another filament what the maker prints in `makers`. */
  onChoose: (makers: string, printedIn: string) => void;
}

type Row = FilamentNeed | 'total';

/** Filament by material: weight, length, spools, cost. */
export function FilamentTable({ needs, card, currency, spoolG, onSpool, onChoose }: FilamentTableProps) {
  const figure = (of: (need: FilamentNeed) => number | null | undefined, show: (value: number) => string) =>
    function Figure(row: Row) {
      const value = row === 'total' ? sumOf(needs.map(of)) : (of(row) ?? null);
      return <Unbroken>{value === null ? texts.unknown : show(value)}</Unbroken>;
    };
  const columns: Column<Row>[] = [
    {
      key: 'material',
      header: texts.material,
      isHeading: true,
      cell: (row) => <span>{row === 'total' ? texts.total : row.makers}</span>,
    },
    {
      key: 'printed-in',
      header: texts.printedIn,
      cell: (row) => {
        if (row === 'total') return null;
        const options = optionsOf(row, card);
        if (options.length === 1) return row.printedIn;
        return (
          <Box width="full" maxWidth="16rem" marginTop={{ md: '-2.5' }}>
            <SelectField
              label={
                <Box as="span" srOnly>
                  {texts.printedInOf(row.makers)}
                </Box>
              }
              options={options}
              value={row.printedIn}
              onChange={(event) => onChoose(row.makers, event.currentTarget.value)}
            />
          </Box>
        );
      },
    },
    {
      key: 'grams',
      header: texts.grams,
      isNumeric: true,
      cell: figure(({ weight }) => weight?.massG, grams),
    },
    {
      key: 'metres',
      header: texts.metres,
      isNumeric: true,
      cell: figure(
        ({ weight }) => weight?.lengthM,
        (value) => `${number(value)} m`,
      ),
    },
    {
      key: 'spools',
      header: texts.spools,
      isNumeric: true,
      cell: figure(
        ({ spools }) => spools,
        (value) => number(value),
      ),
    },
    {
      key: 'cost',
      header: texts.cost,
      isNumeric: true,
      cell: figure(
        ({ costMinor }) => costMinor,
        (minor) => price({ minor, currency }),
      ),
    },
  ];
  return (
    <Box>
      <HairlineTable
        caption={texts.filament}
        columns={columns}
        rows={needs.length > 1 ? [...needs, 'total'] : needs}
        rowKey={(row) => (row === 'total' ? 'total' : `material ${row.makers}`)}
      />
      <Box marginTop="4" maxWidth="9rem">
        <SelectField
          label={texts.spoolSize}
          options={spoolSizesG.map((size) => ({ value: String(size), label: texts.spoolSizes[size] }))}
          value={String(spoolG)}
          onChange={(event) => {
            const size = spoolSizesG.find((one) => String(one) === event.currentTarget.value);
            if (size) onSpool(size);
          }}
        />
      </Box>
    </Box>
  );
}
