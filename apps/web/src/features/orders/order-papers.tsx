import { Box } from '@chakra-ui/react/box';
import type { BuyerOrder } from '@windchest/contracts';
import { orderTexts } from '../../config/texts/order.js';
import { apiAddress } from '../../lib/api-address.js';
import { TextAnchor } from '../../ui/link.js';
import { Heading } from '../../ui/text.js';

export interface OrderPapersProps {
  order: BuyerOrder;
  /** Opens the order without an account; in its place the session does. */
  orderKey: string | undefined;
}

interface Paper {
  key: string;
  href: string;
  label: string;
}

/** The receipt and the credit notes of an order, as PDF. */
export function papersOf({ order, orderKey }: OrderPapersProps): Paper[] {
  const query = { key: orderKey };
  const receipt = order.receiptNumber && {
    key: order.receiptNumber,
    href: apiAddress('GET /orders/:orderId/receipt.pdf', { params: { orderId: order.id }, query }),
    label: orderTexts.receiptPdf(order.receiptNumber),
  };
  const notes = order.refunds.flatMap(({ creditNote }) =>
    creditNote
      ? {
          key: creditNote.id,
          href: apiAddress('GET /orders/:orderId/credit-notes/:creditNoteId.pdf', {
            params: { orderId: order.id, creditNoteId: creditNote.id },
            query,
          }),
          label: orderTexts.creditNotePdf(creditNote.number),
        }
      : [],
  );
  return receipt ? [receipt, ...notes] : notes;
}

export function OrderPapers(props: OrderPapersProps) {
  const papers = papersOf(props);
  if (papers.length === 0) return null;
  return (
    <Box as="section" marginTop="8">
      <Heading level={2} look="subsection" marginBottom="2">
        {orderTexts.papers}
      </Heading>
      <Box as="ul" listStyle="none">
        {papers.map(({ key, href, label }) => (
          <Box
            as="li"
            key={key}
            display="flex"
            justifyContent="space-between"
            gap="4"
            paddingBlock="2"
            borderBottomWidth="1px"
            borderColor="hairline"
          >
            <TextAnchor href={href}>{label}</TextAnchor>
            <Box as="span" color="ink.soft">
              {orderTexts.pdf}
            </Box>
          </Box>
        ))}
      </Box>
    </Box>
  );
}
