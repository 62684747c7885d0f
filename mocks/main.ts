import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { MocksModule, OutsideWorld } from './mocks.module.js';

/** The outside world of the demo in one process; says on one line when it is ready and where. */
try {
  const mocks = await NestFactory.createApplicationContext(MocksModule, { logger: false, abortOnError: false });
  mocks.enableShutdownHooks(['SIGTERM', 'SIGINT'], { useProcessExit: true });
  process.stdout.write(`${JSON.stringify({ ready: true, ...mocks.get(OutsideWorld).ports() })}\n`);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
}
