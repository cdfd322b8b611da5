import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AccountsModule } from '../accounts/accounts.module.js';
import { CatalogueModule } from '../catalogue/catalogue.module.js';
import { CouponsModule } from '../coupons/coupons.module.js';
import { BuyerParts } from './buyer-parts.js';
import { CancelOrder } from './cancel-order.js';
import { CheckoutController } from './checkout.controller.js';
import { ClaimOrders } from './claim-orders.js';
import { CloseOrder } from './close-order.js';
import { DisputeMail } from './disputes/dispute-mail.js';
import { DisputeSteps } from './disputes/dispute-steps.js';
import { DisputeView } from './disputes/dispute-view.js';
import { Dispute } from './disputes/dispute.model.js';
import { FollowDispute } from './disputes/follow-dispute.js';
import { LoseDispute } from './disputes/lose-dispute.js';
import { FlagOrder } from './flag-order.js';
import { FollowMoneyBack } from './follow-money-back.js';
import { FulfilOrder } from './fulfil-order.js';
import { HandlePaymentEvent } from './handle-payment-event.js';
import { ListOrders } from './list-orders.js';
import { OpenCheckout } from './open-checkout.js';
import { OpenPayment } from './open-payment.js';
import { OrderFacts } from './order-facts.js';
import { OrderHistory } from './order-history.js';
import { OrderLine } from './order-line.model.js';
import { OrderPaidMail } from './order-paid-mail.js';
import { OrderPaidSteps } from './order-paid-steps.js';
import { OrderView } from './order-view.js';
import { Order } from './order.model.js';
import { OrdersController } from './orders.controller.js';
import { OrdersReader } from './orders-reader.js';
import { OwnOrders } from './own-orders.js';
import { PlaceOrder } from './place-order.js';
import { PriceBasket } from './price-basket.js';
import { QuoteBasket } from './quote-basket.js';
import { ReconcileOrder } from './reconcile-order.js';
import { RefreshOrder } from './refresh-order.js';
import { AskForRefund } from './refunds/ask-for-refund.js';
import { CarryOutRefund } from './refunds/carry-out-refund.js';
import { DecideRights } from './refunds/decide-rights.js';
import { FollowRefund } from './refunds/follow-refund.js';
import { LineRightSteps } from './refunds/line-right-steps.js';
import { MoneyBackSteps } from './refunds/money-back-steps.js';
import { OrderRefundedMail } from './refunds/order-refunded-mail.js';
import { RefundBook } from './refunds/refund-book.js';
import { RefundLine } from './refunds/refund-line.model.js';
import { RefundView } from './refunds/refund-view.js';
import { Refund } from './refunds/refund.model.js';
import { RefundsController } from './refunds/refunds.controller.js';
import { SettleRefund } from './refunds/settle-refund.js';
import { SalesTax } from './sales-tax.js';
import { SettleOrder } from './settle-order.js';
import { ShowOrder } from './show-order.js';
import { TakeOffFlag } from './take-off-flag.js';
import { UnclearOrders } from './unclear-orders.js';
import { YearRecords } from './year-records.js';

@Module({
  imports: [
    AccountsModule,
    CatalogueModule,
    CouponsModule,
    SequelizeModule.forFeature([Order, OrderLine, Refund, RefundLine, Dispute]),
  ],
  controllers: [CheckoutController, OrdersController, RefundsController],
  providers: [
    SalesTax,
    PriceBasket,
    QuoteBasket,
    PlaceOrder,
    OpenPayment,
    OpenCheckout,
    OrderPaidSteps,
    OrderPaidMail,
    FlagOrder,
    FulfilOrder,
    CloseOrder,
    SettleOrder,
    ReconcileOrder,
    HandlePaymentEvent,
    OrderHistory,
    OrderFacts,
    OrderView,
    OwnOrders,
    RefreshOrder,
    CancelOrder,
    ClaimOrders,
    ListOrders,
    ShowOrder,
    OrdersReader,
    BuyerParts,
    RefundBook,
    RefundView,
    MoneyBackSteps,
    LineRightSteps,
    OrderRefundedMail,
    SettleRefund,
    FollowRefund,
    AskForRefund,
    CarryOutRefund,
    DecideRights,
    TakeOffFlag,
    UnclearOrders,
    YearRecords,
    DisputeSteps,
    DisputeMail,
    DisputeView,
    LoseDispute,
    FollowDispute,
    FollowMoneyBack,
  ],
  exports: [
    BuyerParts,
    OrderPaidSteps,
    MoneyBackSteps,
    DisputeSteps,
    LineRightSteps,
    OrdersReader,
    OrderHistory,
    OrderFacts,
    SalesTax,
    UnclearOrders,
    YearRecords,
  ],
})
export class OrdersModule {}
