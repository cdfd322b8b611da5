import { Box } from '@chakra-ui/react/box';
import { useEffect, useState } from 'react';
import { platesTexts as texts } from '../../config/texts/plates.js';
import { number } from '../../lib/format.js';
import { NumberField } from '../../ui/field/number-field.js';

export interface PlateLayout {
  gapMm: number;
  marginMm: number;
}

const most = { gapMm: 100, marginMm: 200 };
/** Nobody wants plates packed anew for each digit. */
const pauseMs = 350;

const isLength = (value: number, upTo: number) => value >= 0 && value <= upTo;

export interface LayoutFieldsProps {
  layout: PlateLayout;
  onChange: (layout: PlateLayout) => void;
  /** Why the plates cannot be laid out so. */
  refusal: string | undefined;
}

/** Room between pieces and along the edges; taken over a moment after the last change. */
export function LayoutFields({ layout, onChange, refusal }: LayoutFieldsProps) {
  const [typed, setTyped] = useState(layout);
  const isWhole = isLength(typed.gapMm, most.gapMm) && isLength(typed.marginMm, most.marginMm);
  useEffect(() => {
    if (!isWhole || (typed.gapMm === layout.gapMm && typed.marginMm === layout.marginMm)) return undefined;
    const timer = setTimeout(() => onChange(typed), pauseMs);
    return () => clearTimeout(timer);
  }, [typed, isWhole, layout, onChange]);
  const fieldOf = (name: keyof PlateLayout, label: string, fault?: string) => (
    <NumberField
      label={label}
      unit="mm"
      min={0}
      defaultValue={layout[name]}
      error={isLength(typed[name], most[name]) ? fault : texts.lengthRefused(number(most[name]))}
      onChange={(event) => {
        const { valueAsNumber } = event.currentTarget;
        setTyped((before) => ({ ...before, [name]: valueAsNumber }));
      }}
    />
  );
  return (
    <Box role="group" aria-label={texts.layout} display="flex" flexWrap="wrap" gap="4" maxWidth="measure">
      <Box flex="0 1 9rem">{fieldOf('gapMm', texts.gap)}</Box>
      <Box flex="0 1 9rem">{fieldOf('marginMm', texts.margin, refusal)}</Box>
    </Box>
  );
}
