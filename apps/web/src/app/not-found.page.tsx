import { paths } from '../config/paths.js';
import { noPageTexts } from '../config/texts/no-page.js';
import { LinkButton } from '../ui/button.js';
import { PageTitle } from '../ui/page-title.js';
import { Band } from '../ui/sheet.js';
import { Heading, Text } from '../ui/text.js';

export const NotFoundPage = () => (
  <Band>
    <PageTitle title={noPageTexts.notFound} />
    <Heading level={1} look="title">
      {noPageTexts.notFound}
    </Heading>
    <Text look="lead" marginTop="3" marginBottom="6">
      {noPageTexts.notFoundDetail}
    </Text>
    <LinkButton to={paths.home.to()}>{noPageTexts.toKits}</LinkButton>
  </Band>
);
