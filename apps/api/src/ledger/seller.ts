import type { Config } from '../config/config.js';
import type { ReceiptSeller } from './receipt-parties.js';

type SellerSettings = Pick<
  Config,
  'WORKSHOP_NAME' | 'WORKSHOP_SELLER' | 'WORKSHOP_ADDRESS' | 'WORKSHOP_COUNTRY' | 'WORKSHOP_VAT_NUMBER'
>;

/** Who sells now, by the settings. */
export const sellerOf = (config: SellerSettings): ReceiptSeller => ({
  name: config.WORKSHOP_SELLER || config.WORKSHOP_NAME,
  address: config.WORKSHOP_ADDRESS,
  country: config.WORKSHOP_COUNTRY,
  vatNumber: config.WORKSHOP_VAT_NUMBER || null,
});
