import { paths } from '../../config/paths.js';
import { TextLink } from '../../ui/link.js';

export interface SubjectLinkProps {
  /** The number stands for either. */
  subject: { orderId: string | null; pledgeId: string | null; orderNumber: string };
}

/** The number of the order or pledge a receipt is of, leading to it. */
export const SubjectLink = ({ subject: { orderId, pledgeId, orderNumber } }: SubjectLinkProps) => (
  <TextLink
    to={
      orderId
        ? paths.workshop.order.to({ orderId })
        : paths.workshop.supporter.to({ pledgeId: pledgeId ?? '' })
    }
    whiteSpace="nowrap"
  >
    {orderNumber}
  </TextLink>
);
