import { Box } from '@chakra-ui/react/box';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { planFormTexts as texts, plansTexts } from '../../config/texts/workshop-supporters.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading, Text } from '../../ui/text.js';
import { PlanFields } from './plan-fields.js';

/** Makes a plan. */
export function NewPlanPage() {
  const navigate = useNavigate();
  const { session, may } = useSession();
  const { run, fault } = useAction('POST /workshop/plans', ['GET /workshop/plans']);
  return (
    <Band>
      <PageTitle title={texts.newTitle} />
      <Text isSoft>
        <TextLink to={paths.workshop.plans.to()}>{plansTexts.caption}</TextLink>
      </Text>
      <Heading level={1} marginBottom="6">
        {texts.newTitle}
      </Heading>
      <Box maxWidth="52rem">
        {session && (
          <PlanFields
            plan={null}
            currency={session.workshop.currency}
            isWritable={may('plans:write')}
            fault={fault}
            save={async (body) => {
              const outcome = await run({ body });
              if (outcome.isDone) void navigate(paths.workshop.plan.to({ planId: outcome.data.id }));
              return outcome;
            }}
          />
        )}
      </Box>
    </Band>
  );
}
