import { Box } from '@chakra-ui/react/box';
import type { Coupon } from '@windchest/contracts';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { paths } from '../../config/paths.js';
import { couponFormTexts as texts, couponsTexts } from '../../config/texts/workshop-coupons.js';
import { number, price } from '../../lib/format.js';
import { useSession } from '../../lib/session.js';
import { useAction } from '../../lib/use-action.js';
import { useEndpoint } from '../../lib/use-endpoint.js';
import { Fault } from '../../ui/fault.js';
import { TextLink } from '../../ui/link.js';
import { PageTitle } from '../../ui/page-title.js';
import { Progress } from '../../ui/progress.js';
import { Band, SplitSheet } from '../../ui/sheet.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Heading, Text } from '../../ui/text.js';
import { TitleBlock } from '../../ui/title-block.js';
import { CouponFields } from './coupon-fields.js';
import { CouponOrders } from './coupon-orders.js';
import { CouponUses } from './coupon-uses.js';
import { offWords, standingOf } from './coupon-words.js';

const Numbers = ({ coupon }: { coupon: Coupon }) => (
  <TitleBlock
    columns={2}
    fields={[
      { name: texts.facts.held, value: number(coupon.held) },
      { name: texts.facts.redeemed, value: number(coupon.redeemed) },
      { name: texts.facts.left, value: coupon.left === null ? texts.noCap : number(coupon.left) },
      { name: texts.facts.takenOff, value: price(coupon.takenOff) },
    ]}
  />
);

/** One code: its form, and beside it how it stands at this moment. */
export function CouponPage() {
  const { couponId = '' } = useParams();
  const { session, may } = useSession();
  const [now] = useState(() => new Date());
  const {
    data: coupon,
    fault: readFault,
    mutate,
  } = useEndpoint('GET /workshop/coupons/:couponId', { params: { couponId } }, { refreshInterval: 5000 });
  const { run, fault } = useAction('PUT /workshop/coupons/:couponId', [
    'GET /workshop/coupons',
    'GET /workshop/coupons/:couponId',
  ]);
  if (!coupon || !session)
    return (
      <Band>
        {readFault ? (
          <Fault what={texts.notFound} fault={readFault} onAgain={() => void mutate()} level={2} />
        ) : (
          <SkeletonLines lines={6} />
        )}
      </Band>
    );
  const standing = standingOf(coupon, now);
  return (
    <>
      <PageTitle title={coupon.code} />
      <SplitSheet
        asideLabel={texts.standing}
        main={
          <>
            <Text isSoft>
              <TextLink to={paths.workshop.coupons.to()}>{couponsTexts.title}</TextLink>
            </Text>
            <Heading level={1} marginBottom="6">
              {coupon.code}{' '}
              <Box as="span" fontWeight="normal" color="ink.soft">
                {couponsTexts.states[standing]}
              </Box>
            </Heading>
            <CouponFields
              key={coupon.id}
              coupon={coupon}
              currency={session.workshop.currency}
              isWritable={may('coupons:write')}
              fault={fault}
              save={(body) => run({ params: { couponId }, body })}
            />
          </>
        }
        aside={
          <>
            <Heading level={2} look="subsection" marginBottom="3">
              {texts.standing}
            </Heading>
            {coupon.cap !== null ? (
              <Progress
                label={offWords(coupon)}
                done={(coupon.redeemed + coupon.held) / coupon.cap}
                words={couponsTexts.redeemedOf(coupon.redeemed, coupon.cap)}
              />
            ) : (
              <Text>{offWords(coupon)}</Text>
            )}
            <Text look="small" isSoft marginTop="3">
              {texts.live}
            </Text>
          </>
        }
        block={<Numbers coupon={coupon} />}
      />
      <Band>
        <Box display="grid" gap="12">
          <CouponUses coupon={coupon} />
          <CouponOrders couponId={coupon.id} />
        </Box>
      </Band>
    </>
  );
}
