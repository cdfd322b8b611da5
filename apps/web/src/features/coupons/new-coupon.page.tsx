import { Box } from '@chakra-ui/react/box';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { couponFormTexts as texts } from '../../config/texts/workshop-coupons.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { PageTitle } from '../../ui/page-title.js';
import { Band } from '../../ui/sheet.js';
import { Heading } from '../../ui/text.js';
import { CouponFields } from './coupon-fields.js';

/** Makes a code. */
export function NewCouponPage() {
  const navigate = useNavigate();
  const { session, may } = useSession();
  const { run, fault } = useAction('POST /workshop/coupons', ['GET /workshop/coupons']);
  return (
    <Band>
      <PageTitle title={texts.newTitle} />
      <Heading level={1} marginBottom="6">
        {texts.newTitle}
      </Heading>
      <Box maxWidth="44rem">
        {session && (
          <CouponFields
            coupon={null}
            currency={session.workshop.currency}
            isWritable={may('coupons:write')}
            fault={fault}
            save={async (body) => {
              const outcome = await run({ body });
              if (outcome.isDone) void navigate(paths.workshop.coupon.to({ couponId: outcome.data.id }));
              return outcome;
            }}
          />
        )}
      </Box>
    </Band>
  );
}
