import type { WorkshopRefund } from '@windchest/contracts';
import { refundTexts as texts } from '../../config/texts/workshop-refunds.js';
import { price } from '../../lib/format.js';
import { Notice } from '../../ui/notice.js';
import { Progress } from '../../ui/progress.js';
import { SkeletonLines } from '../../ui/skeleton-lines.js';
import { Text } from '../../ui/text.js';

/** From asked to confirmed, as the page reads the order again and again. */
export function RefundProgress({ refund }: { refund: WorkshopRefund | undefined }) {
  if (!refund) return <SkeletonLines lines={2} />;
  const amount = price(refund.amount);
  if (refund.state === 'asked')
    return (
      <>
        <Progress label={texts.waiting(amount)} />
        <Text look="small" isSoft marginTop="2">
          {texts.waitingMore}
        </Text>
      </>
    );
  if (refund.state === 'succeeded')
    return (
      <Notice tone="ok" title={texts.done(amount)} isNews>
        {texts.doneMore(refund.creditNote?.number ?? null)}
      </Notice>
    );
  return (
    <Notice tone="stop" title={texts.refused} isNews>
      {refund.fault}
    </Notice>
  );
}
