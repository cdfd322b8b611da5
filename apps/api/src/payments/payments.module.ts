import { Global, Module } from '@nestjs/common';
import { HandlePaymentEvent } from './handle-payment-event.js';
import { PaymentEventHandlers } from './payment-event-handlers.js';
import { PaymentsController } from './payments.controller.js';
import { ReceivePaymentEvent } from './receive-payment-event.js';

/** What all rooms that take money share: the inbox of payment events. Knows no room. */
@Global()
@Module({
  controllers: [PaymentsController],
  providers: [PaymentEventHandlers, ReceivePaymentEvent, HandlePaymentEvent],
  exports: [PaymentEventHandlers],
})
export class PaymentsModule {}
