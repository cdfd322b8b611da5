import type { BuyerOrder } from '@windchest/contracts';
import type { SignName } from '../../ui/sign.js';

export const orderSigns: Record<BuyerOrder['state'], SignName> = {
  open: 'wait',
  paid: 'ok',
  cancelled: 'none',
  expired: 'none',
  refunded: 'none',
};
