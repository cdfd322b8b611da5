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
import { FlagOrder } from './flag-order.js';
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
import { ReceivePaymentEvent } from './receive-payment-event.js';
import { ReconcileOrder } from './reconcile-order.js';
import { RefreshOrder } from './refresh-order.js';
import { SettleOrder } from './settle-order.js';
import { ShowOrder } from './show-order.js';

@Module({
  imports: [AccountsModule, CatalogueModule, CouponsModule, SequelizeModule.forFeature([Order, OrderLine])],
  controllers: [CheckoutController, OrdersController],
  providers: [
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
    ReceivePaymentEvent,
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
  ],
  exports: [BuyerParts, OrderPaidSteps, OrdersReader, OrderHistory, OrderFacts],
})
export class OrdersModule {}
