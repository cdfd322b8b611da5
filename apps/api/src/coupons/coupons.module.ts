import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { ClaimPlaces } from './claim-places.js';
import { CouponBuyers } from './coupon-buyers.js';
import { CouponKit } from './coupon-kit.model.js';
import { CouponView } from './coupon-view.js';
import { Coupon } from './coupon.model.js';
import { CouponsController } from './coupons.controller.js';
import { Coupons } from './coupons.js';
import { CouponsReader } from './coupons-reader.js';
import { ListOffers } from './list-offers.js';
import { SaveCoupon } from './save-coupon.js';
import { SupporterCheck } from './supporter-check.js';

@Module({
  imports: [AccountsModule, CatalogueModule, SequelizeModule.forFeature([Coupon, CouponKit])],
  controllers: [CouponsController],
  providers: [
    ClaimPlaces,
    CouponBuyers,
    Coupons,
    CouponsReader,
    CouponView,
    ListOffers,
    SaveCoupon,
    SupporterCheck,
  ],
  exports: [Coupons, CouponsReader, SupporterCheck],
})
export class CouponsModule {}
