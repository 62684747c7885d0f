import { Body, Controller, Get, Headers, HttpCode, Param, Post, Query, Req, type RawBodyRequest } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { checkoutSchema, paymentReturnQuerySchema, recordPaymentSchema, type InvoiceView, type PaymentReturn, type RecordPayment, type StartCheckout } from '@shared/invoices';
import type { FastifyRequest } from 'fastify';
import type { z } from 'zod';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { CheckoutService } from './checkout.service.js';
import { PaymentEventsService } from './payment-events.service.js';
import { RecordedPaymentsService } from './recorded-payments.service.js';

@ApiTags('payments')
@Controller()
export class PaymentsController {
  constructor(
    private readonly recorded: RecordedPaymentsService,
    private readonly checkout: CheckoutService,
    private readonly events: PaymentEventsService,
  ) {}

  @Post('invoices/:id/payments')
  @Needs('payments.record')
  record(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: recordPaymentSchema }) input: RecordPayment): Promise<InvoiceView> {
    return this.recorded.record(actor, id, input);
  }

  @Post('portal/invoices/:id/checkout')
  @Needs('portal.use')
  start(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: checkoutSchema }) input: StartCheckout): Promise<{ url: string }> {
    return this.checkout.start(actor, id, input);
  }

  @Get('portal/invoices/:id/payment-return')
  @Needs('portal.use')
  cameBack(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Query({ schema: paymentReturnQuerySchema }) query: z.infer<typeof paymentReturnQuerySchema>): Promise<PaymentReturn> {
    return this.checkout.cameBack(actor, id, query.session_id);
  }

  /** Open to anybody who can sign as the payment service; the signature is over the bytes as they came. */
  @Post('payments/events')
  @HttpCode(200)
  @Needs('public')
  event(@Req() request: RawBodyRequest<FastifyRequest>, @Headers('stripe-signature') signature?: string): Promise<{ received: true }> {
    return this.events.receive(request.rawBody, signature);
  }
}
