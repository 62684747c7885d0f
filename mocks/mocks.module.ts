import { Inject, Injectable, Module, type OnApplicationBootstrap, type OnApplicationShutdown } from '@nestjs/common';
import { startMailbox, type Mailbox } from './mailbox/start-mailbox.js';
import { mocksConfig, type MocksConfig } from './mocks-config.js';
import { startStripeMock, type StripeMock } from './stripe-mock/start-stripe-mock.js';

const CONFIG = Symbol('the settings of the mocks');

/** Starts the outside world with the application context and ends it with it. */
@Injectable()
export class OutsideWorld implements OnApplicationBootstrap, OnApplicationShutdown {
  private stripe: StripeMock | undefined;
  private mailbox: Mailbox | undefined;

  constructor(@Inject(CONFIG) private readonly config: MocksConfig) {}

  async onApplicationBootstrap(): Promise<void> {
    const { config } = this;
    const host = config.MOCKS_HOST;
    this.mailbox = await startMailbox({ host, smtpPort: config.MAILBOX_SMTP_PORT, httpPort: config.MAILBOX_HTTP_PORT, stateDir: config.MOCKS_STATE_DIR });
    try {
      this.stripe = await startStripeMock({
        host,
        port: config.STRIPE_MOCK_PORT,
        secretKey: config.STRIPE_MOCK_SECRET_KEY,
        publicUrl: config.STRIPE_MOCK_PUBLIC_URL,
        webhookUrl: config.STRIPE_WEBHOOK_URL,
        webhookSecret: config.STRIPE_WEBHOOK_SECRET,
        stateDir: config.MOCKS_STATE_DIR,
      });
    } catch (error) {
      // Half a world would keep the process alive without serving anybody.
      await this.mailbox.close();
      throw error;
    }
  }

  ports(): { stripe: { port: number }; smtp: { port: number }; mailbox: { port: number } } {
    return { stripe: { port: this.stripe?.port ?? 0 }, smtp: { port: this.mailbox?.smtp.port ?? 0 }, mailbox: { port: this.mailbox?.http.port ?? 0 } };
  }

  async onApplicationShutdown(): Promise<void> {
    await Promise.all([this.stripe?.close(), this.mailbox?.close()]);
  }
}

@Module({ providers: [{ provide: CONFIG, useFactory: () => mocksConfig(process.env) }, OutsideWorld] })
export class MocksModule {}
