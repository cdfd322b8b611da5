import type { Quote } from '@windchest/contracts';
import { basketTexts } from '../../config/texts/basket.js';
import { priceTexts } from '../../config/texts/shared.js';
import { number, price } from '../../lib/format.js';
import { Button } from '../../ui/button.js';
import { TitleBlock } from '../../ui/title-block.js';

export interface BasketBlockProps {
  quote: Quote;
  formId: string;
  /** The form is there and the price is that of the basket. */
  isReady: boolean;
  isOpening: boolean;
}

/** The sum, and the button that goes on to the payment page. */
export const BasketBlock = ({ quote, formId, isReady, isOpening }: BasketBlockProps) => (
  <TitleBlock
    columns={2}
    fields={[
      { name: basketTexts.kits, value: number(quote.lines.length) },
      { name: basketTexts.blockCode, value: quote.coupon?.code ?? basketTexts.blockNoCode },
    ]}
    summary={{
      name: basketTexts.total,
      value: quote.total.minor === 0 ? priceTexts.free : price(quote.total),
    }}
    action={
      <Button
        look="cell"
        type="submit"
        form={formId}
        isBusy={!isReady || isOpening}
        busyWords={isOpening ? basketTexts.opening : undefined}
      >
        {quote.total.minor === 0 ? basketTexts.getFree : basketTexts.pay(price(quote.total))}
      </Button>
    }
  />
);
