import { Global, Module } from '@nestjs/common';
import { CONFIG, type Config } from '../config/config.js';
import { Mailer, SmtpMailer } from './mailer.js';
import { MessagesController } from './messages.controller.js';
import { MessagesService } from './messages.service.js';
import { OutboxService } from './outbox.service.js';
import { OutboxWorker } from './outbox.worker.js';

@Global()
@Module({
  controllers: [MessagesController],
  providers: [OutboxService, OutboxWorker, MessagesService, { provide: Mailer, inject: [CONFIG], useFactory: (config: Config) => new SmtpMailer(config.smtpUrl, config.mailFrom) }],
  exports: [OutboxService, OutboxWorker],
})
export class OutboxModule {}
