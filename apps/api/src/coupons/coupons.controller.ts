import { Controller } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { Endpoint, Input } from '../http/endpoint.js';
import { ThisPerson, type SignedIn } from '../http/person.js';
import { CouponView } from './coupon-view.js';
import { ListOffers } from './list-offers.js';
import { SaveCoupon } from './save-coupon.js';

@Controller()
export class CouponsController {
  constructor(
    private readonly view: CouponView,
    private readonly save: SaveCoupon,
    private readonly offers: ListOffers,
  ) {}

  @Endpoint('GET /offers')
  listOffers(): Promise<Answer<'GET /offers'>> {
    return this.offers.list();
  }

  @Endpoint('GET /workshop/coupons')
  list(@Input() input: Handled<'GET /workshop/coupons'>): Promise<Answer<'GET /workshop/coupons'>> {
    return this.view.list(input);
  }

  @Endpoint('GET /workshop/coupons/:couponId')
  read(
    @Input() { params }: Handled<'GET /workshop/coupons/:couponId'>,
  ): Promise<Answer<'GET /workshop/coupons/:couponId'>> {
    return this.view.one(params.couponId);
  }

  @Endpoint('GET /workshop/coupons/:couponId/uses')
  uses(
    @Input() { params }: Handled<'GET /workshop/coupons/:couponId/uses'>,
  ): Promise<Answer<'GET /workshop/coupons/:couponId/uses'>> {
    return this.view.uses(params.couponId);
  }

  @Endpoint('POST /workshop/coupons')
  create(
    @ThisPerson() person: SignedIn,
    @Input() { body }: Handled<'POST /workshop/coupons'>,
  ): Promise<Answer<'POST /workshop/coupons'>> {
    return this.save.create(person, body);
  }

  @Endpoint('PUT /workshop/coupons/:couponId')
  change(
    @ThisPerson() person: SignedIn,
    @Input() { params, body }: Handled<'PUT /workshop/coupons/:couponId'>,
  ): Promise<Answer<'PUT /workshop/coupons/:couponId'>> {
    return this.save.change(person, params.couponId, body);
  }
}
