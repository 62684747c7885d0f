import { Module, type DynamicModule } from '@nestjs/common';
import { APP_FILTER, APP_INTERCEPTOR, APP_PIPE } from '@nestjs/core';
import { AcceptanceModule } from './acceptance/acceptance.module.js';
import { AttachmentsModule } from './attachments/attachments.module.js';
import { AuthModule } from './auth/auth.module.js';
import { BurnoutsModule } from './burnouts/burnouts.module.js';
import { CertificatesModule } from './certificates/certificates.module.js';
import { ClockModule } from './clock/clock.module.js';
import { ConfigModule } from './config/config.module.js';
import type { Config } from './config/config.js';
import { CustomersModule } from './customers/customers.module.js';
import { DatabaseModule } from './database/database.module.js';
import { EquipmentModule } from './equipment/equipment.module.js';
import { HistoryModule } from './history/history.module.js';
import { ErrorFilter } from './http/error.filter.js';
import { HealthController } from './http/health.controller.js';
import { schemaPipe } from './http/schema.pipe.js';
import { IdempotencyInterceptor } from './idempotency/idempotency.interceptor.js';
import { InsightModule } from './insight/insight.module.js';
import { InstrumentsModule } from './instruments/instruments.module.js';
import { InvoicesModule } from './invoices/invoices.module.js';
import { JobsModule } from './jobs/jobs.module.js';
import { MachinesModule } from './machines/machines.module.js';
import { OutboxModule } from './outbox/outbox.module.js';
import { PapersModule } from './papers/papers.module.js';
import { PaymentsModule } from './payments/payments.module.js';
import { PortalModule } from './portal/portal.module.js';
import { QuotesModule } from './quotes/quotes.module.js';
import { RecordsModule } from './records/records.module.js';
import { SearchModule } from './search/search.module.js';
import { ShopModule } from './shop/shop.module.js';
import { SignOffsModule } from './sign-offs/sign-offs.module.js';
import { UsersModule } from './users/users.module.js';

@Module({})
export class AppModule {
  static register(config: Config): DynamicModule {
    return {
      module: AppModule,
      imports: [ConfigModule.register(config), ClockModule, DatabaseModule, HistoryModule, ShopModule, PapersModule, OutboxModule, AuthModule, UsersModule, AcceptanceModule, EquipmentModule, InstrumentsModule, RecordsModule, BurnoutsModule, InsightModule, SignOffsModule, CertificatesModule, CustomersModule, MachinesModule, JobsModule, AttachmentsModule, SearchModule, QuotesModule, InvoicesModule, PaymentsModule, PortalModule],
      controllers: [HealthController],
      providers: [
        { provide: APP_PIPE, useFactory: schemaPipe },
        { provide: APP_FILTER, useClass: ErrorFilter },
        { provide: APP_INTERCEPTOR, useClass: IdempotencyInterceptor },
      ],
    };
  }
}
