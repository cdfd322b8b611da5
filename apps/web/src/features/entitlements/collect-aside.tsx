import { Box } from '@chakra-ui/react/box';
import { paths } from '../../config/paths.js';
import { collectTexts } from '../../config/texts/shelf.js';
import { useSession } from '../../lib/session.js';
import { LinkButton } from '../../ui/button.js';
import { TextLink } from '../../ui/link.js';
import { Heading, Text } from '../../ui/text.js';
import { FreshLink } from './fresh-link.js';

export interface CollectAsideProps {
  token: string;
  isOpen: boolean;
}

/** What else there is to do: a fresh link before this one ends, a shelf, and what to mind. */
export function CollectAside({ token, isOpen }: CollectAsideProps) {
  const { isSignedIn } = useSession();
  return (
    <Box display="grid" gap="7" justifyItems="start">
      <Box>
        <Heading level={2} look="subsection">
          {collectTexts.account}
        </Heading>
        <Text isSoft marginTop="1" marginBottom="3">
          {collectTexts.accountWhy}
        </Text>
        <LinkButton look="outline" to={isSignedIn ? paths.shelf.to() : paths.join.to()}>
          {isSignedIn ? collectTexts.toShelf : collectTexts.join}
        </LinkButton>
      </Box>
      {isOpen && (
        <Box>
          <Text isSoft marginBottom="3">
            {collectTexts.freshWhy}
          </Text>
          <FreshLink token={token} />
        </Box>
      )}
      <Text look="small" paddingTop="4" borderTopWidth="1px" borderColor="hairline">
        {collectTexts.cautions} <TextLink to={paths.cautions.to()}>{collectTexts.allCautions}</TextLink>
      </Text>
    </Box>
  );
}
