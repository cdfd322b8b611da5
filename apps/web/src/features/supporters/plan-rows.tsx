import { Box } from '@chakra-ui/react/box';
import { chakra } from '@chakra-ui/react/styled-system';
import type { Plan } from '@windchest/contracts';
import { useMemo } from 'react';
import { keepsTexts, supportTexts as texts } from '../../config/texts/pledge.js';
import { price } from '../../lib/format.js';
import { extentOfAll } from '../../ui/drawing/rank-layout.js';
import { RadioInput } from '../../ui/field/tick.js';
import { Markdown } from '../../ui/markdown.js';
import { Text } from '../../ui/text.js';
import { VisuallyHidden } from '../../ui/visually-hidden.js';
import { drawnVoices } from '../bench/drawn-voices.js';
import { PlanRanks } from './plan-ranks.js';

const Row = chakra('div', {
  base: {
    paddingBlock: '6',
    borderBottomWidth: '1px',
    borderColor: 'hairline',
    display: 'grid',
    gap: '4',
    gridTemplateColumns: 'minmax(0, 1fr)',
  },
});

export interface PlanRowsProps {
  plans: readonly Plan[];
  chosenId: string | undefined;
  onChoose: (planId: string) => void;
}

/** The plans as ruled choices, their kits drawn to one scale. */
export function PlanRows({ plans, chosenId, onChoose }: PlanRowsProps) {
  const extent = useMemo(
    () => extentOfAll(plans.flatMap((plan) => plan.kits.map((kit) => drawnVoices(kit.rank)))),
    [plans],
  );
  return (
    <chakra.fieldset border="0" padding="0" margin="0" minWidth="0">
      <VisuallyHidden as="legend">{texts.choose}</VisuallyHidden>
      <Box borderTopWidth="1px" borderColor="hairline">
        {plans.map((plan) => (
          <Row key={plan.id}>
            <Box
              as="label"
              display="flex"
              flexWrap="wrap"
              alignItems="baseline"
              columnGap="3"
              rowGap="1"
              cursor="pointer"
            >
              <RadioInput
                name="plan"
                value={plan.id}
                checked={plan.id === chosenId}
                onChange={() => onChoose(plan.id)}
              />
              <Box textStyle="section" fontWeight="bold" flex="1 1 auto" overflowWrap="anywhere">
                {plan.name}
              </Box>
              <Box fontWeight="semibold" whiteSpace="nowrap">
                {price(plan.amount)}{' '}
                <Box as="span" fontWeight="normal" color="ink.soft">
                  {texts.aMonth}
                </Box>
              </Box>
            </Box>
            <Box display="grid" gap="4" paddingLeft={{ sm: '7' }}>
              {plan.words && (
                <Box maxWidth="measure">
                  <Markdown text={plan.words} />
                </Box>
              )}
              {plan.kits.length > 0 ? (
                <PlanRanks kits={plan.kits} extent={extent} />
              ) : (
                <Text isSoft>{texts.noKitsYet}</Text>
              )}
              <Text look="small" isSoft>
                {plan.hasAllKits && `${texts.allKits} `}
                {keepsTexts[plan.keepsAfter]}
              </Text>
            </Box>
          </Row>
        ))}
      </Box>
    </chakra.fieldset>
  );
}
