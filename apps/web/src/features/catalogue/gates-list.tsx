import { Box } from '@chakra-ui/react/box';
import type { Gate, RevisionDetail } from '@windchest/contracts';
import { gateTexts } from '../../config/texts/workshop-revision.js';
import type { SignName } from '../../ui/sign.js';
import { StatusLine } from '../../ui/status-mark.js';
import { Heading } from '../../ui/text.js';
import { GateWaiver } from './gate-waiver.js';

const signs: Record<Gate['state'], SignName> = {
  passed: 'ok',
  open: 'stop',
  waived: 'warn',
  'not-needed': 'none',
};

/** What a release waits for: a sign, the gate, how it stands, and why. */
export const GatesList = ({ revision }: { revision: RevisionDetail }) => (
  <>
    <Heading level={2} look="subsection" marginBottom="2" id="release" scrollMarginTop="4">
      {revision.releasedAt ? gateTexts.headingReleased : gateTexts.heading}
    </Heading>
    <Box as="ul" listStyle="none">
      {revision.gates.map((gate) => (
        <StatusLine key={gate.name} state={signs[gate.state]}>
          <Box display="flex" justifyContent="space-between" alignItems="baseline" gap="3">
            <span>{gateTexts.names[gate.name]}</span>
            <Box
              as="span"
              fontSize="sm"
              fontWeight={gate.state === 'open' ? 'semibold' : undefined}
              color={gate.state === 'open' ? 'stop' : 'ink.soft'}
              whiteSpace="nowrap"
            >
              {gateTexts.states[gate.state]}
            </Box>
          </Box>
          {gate.reason && (
            <Box fontSize="sm" lineHeight="snug" color="ink.soft" overflowWrap="anywhere">
              {gate.reason}
            </Box>
          )}
          <GateWaiver revision={revision} gate={gate} />
        </StatusLine>
      ))}
    </Box>
  </>
);
