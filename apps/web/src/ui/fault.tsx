import { Box } from '@chakra-ui/react/box';
import type { ReactNode } from 'react';
import { faultTexts } from '../config/texts/shared.js';
import { Button } from './button.js';
import { Sign } from './sign.js';
import { Heading, Text } from './text.js';

export interface FaultProps {
  /** What happened: an ApiFault fits. */
  fault: { title: string; detail?: string; requestId?: string };
  /** To what: "The order was not placed." Stands before the fault's own words. */
  what?: string;
  /** The one thing to do, where it can be tried again. */
  onAgain?: () => void;
  /** Another thing to do: a link. */
  children?: ReactNode;
  level?: 1 | 2 | 3;
}

/** What happened, to what, and what to do. */
export function Fault({ fault, what, onAgain, children, level = 3 }: FaultProps) {
  return (
    <Box role="alert" display="flex" gap="3" paddingBlock="4" borderBlockWidth="1px" borderColor="stop">
      <Sign name="stop" color="stop" marginTop="0.35em" />
      <Box flex="1" minWidth="0">
        <Heading level={level} look="body">
          {what ?? fault.title}
        </Heading>
        {what && <Text>{fault.title}.</Text>}
        {fault.detail && <Text isSoft>{fault.detail}</Text>}
        {fault.requestId && (
          <Text look="small" isSoft marginTop="1">
            {faultTexts.requestId}{' '}
            <Box as="code" fontFamily="mono" fontSize="0.92em">
              {fault.requestId}
            </Box>
            .
          </Text>
        )}
        {(onAgain || children) && (
          <Box display="flex" flexWrap="wrap" gap="3" alignItems="center" marginTop="3">
            {onAgain && (
              <Button look="outline" size="sm" onClick={onAgain}>
                {faultTexts.again}
              </Button>
            )}
            {children}
          </Box>
        )}
      </Box>
    </Box>
  );
}
