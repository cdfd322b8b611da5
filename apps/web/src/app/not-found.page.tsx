import { paths } from '../config/paths.js';
import { faultTexts } from '../config/texts/shared.js';
import { LinkButton } from '../ui/button.js';
import { PageTitle } from '../ui/page-title.js';
import { Band } from '../ui/sheet.js';
import { Heading, Text } from '../ui/text.js';

export const NotFoundPage = () => (
  <Band>
    <PageTitle title={faultTexts.notFound} />
    <Heading level={1} look="title">
      {faultTexts.notFound}
    </Heading>
    <Text look="lead" marginTop="3" marginBottom="6">
      {faultTexts.notFoundDetail}
    </Text>
    <LinkButton to={paths.home.to()}>{faultTexts.toKits}</LinkButton>
  </Band>
);
