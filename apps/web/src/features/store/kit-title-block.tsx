import type { KitPage, Licence } from '@windchest/contracts';
import type { ReactNode } from 'react';
import { kitTexts } from '../../config/texts/kit.js';
import { date, grams, millimetres, number, price } from '../../lib/format.js';
import { Price } from '../../ui/price.js';
import { TitleBlock, type TitleBlockField } from '../../ui/title-block.js';
import type { Offer } from './offers.js';
import { orFree } from './or-free.js';

/** Plates and filament take the place of sizes where they have been worked out. */
function fieldsOf(kit: KitPage, scale: string): TitleBlockField[] {
  const { printEstimate } = kit;
  return [
    { name: kitTexts.revision, value: kit.revision },
    { name: kitTexts.released, value: date(kit.releasedAt) },
    ...(scale ? [{ name: kitTexts.scale, value: scale }] : []),
    ...(kit.compass ? [{ name: kitTexts.compass, value: kit.compass }] : []),
    ...(printEstimate
      ? [
          { name: kitTexts.plates(number(printEstimate.bed.xMm)), value: number(printEstimate.plates) },
          { name: kitTexts.filament, value: grams(printEstimate.massG) },
        ]
      : [
          { name: kitTexts.tallest, value: millimetres(kit.tallestPartMm, 0) },
          { name: kitTexts.parts, value: number(kit.partCount) },
        ]),
  ];
}

function priceName(licence: Licence, offer: Offer | undefined): string {
  if (!offer) return licence.price.minor === 0 ? kitTexts.free : kitTexts.price;
  return offer.cap === null || offer.left === null
    ? kitTexts.withCode(offer.code)
    : kitTexts.withCodeLeft(offer.code, number(offer.left), number(offer.cap));
}

export interface KitTitleBlockProps {
  kit: KitPage;
  /** `1 : 2`, of the rank as it is drawn. */
  scale: string;
  licence: Licence | undefined;
  offer: Offer | undefined;
  action: ReactNode;
}

export const KitTitleBlock = ({ kit, scale, licence, offer, action }: KitTitleBlockProps) => (
  <TitleBlock
    fields={fieldsOf(kit, scale)}
    summary={
      licence && {
        name: priceName(licence, offer),
        value: (
          <Price price={orFree(offer?.price ?? licence.price)} original={offer && price(licence.price)} />
        ),
      }
    }
    action={action}
  />
);
