import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { AppModule } from './app.module.js';
import { ConfigError, readConfig } from './config/config.js';
import { DataFolderBusy, takeDataFolder } from './database/data-folder.js';
import { migrate } from './database/migrate.js';
import { createLogger, PinoNestLogger } from './http/logger.js';
import { createAdapter, setup } from './http/setup.js';

async function start(): Promise<void> {
  const config = readConfig(process.env);
  const logger = createLogger(config.logLevel);
  const folder = takeDataFolder(config.dataDir);
  process.on('exit', () => folder.release());
  const report = await migrate(config.dataDir, new Date().toISOString());
  if (report.applied.length > 0) logger.info({ migrations: report.applied, backup: report.backup }, 'database brought to this version');
  const app = await NestFactory.create<NestFastifyApplication>(AppModule.register(config), createAdapter(logger), { rawBody: true, logger: new PinoNestLogger(logger) });
  await setup(app, config);
  await app.listen(config.port, config.host);
  process.on('unhandledRejection', (reason) => logger.error({ err: reason }, 'a promise was left without an answer'));
  const address = app.getHttpServer().address() as { port: number };
  process.stdout.write(`${JSON.stringify({ ready: true, port: address.port })}\n`);
}

start().catch((error: unknown) => {
  const words = error instanceof ConfigError || error instanceof DataFolderBusy ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error);
  process.stderr.write(`${words}\n`);
  process.exit(78);
});
