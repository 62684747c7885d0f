import { Module } from '@nestjs/common';
import { CONFIG, type Config } from '../config/config.js';
import { InvoicesModule } from '../invoices/invoices.module.js';
import { CheckoutService } from './checkout.service.js';
import { LookRoundService } from './look-round.service.js';
import { PaymentBookService } from './payment-book.service.js';
import { PaymentEventsService } from './payment-events.service.js';
import { PaymentService } from './payment-service.js';
import { PaymentsController } from './payments.controller.js';
import { RecordedPaymentsService } from './recorded-payments.service.js';
import { SettleService } from './settle.service.js';
import { StripePayments } from './stripe-payments.js';

@Module({
  imports: [InvoicesModule],
  controllers: [PaymentsController],
  providers: [
    { provide: PaymentService, inject: [CONFIG], useFactory: (config: Config) => new StripePayments(config.stripe) },
    PaymentBookService,
    SettleService,
    CheckoutService,
    RecordedPaymentsService,
    PaymentEventsService,
    LookRoundService,
  ],
  exports: [LookRoundService],
})
export class PaymentsModule {}
