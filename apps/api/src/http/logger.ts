import type { LoggerService } from '@nestjs/common';
import { pino, type DestinationStream, type Logger } from 'pino';
import { requestContext } from './request-context.js';

/** One logger for requests and for the application: JSON lines in UTC, no secrets, no query strings, no rows. */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  return pino(
    {
      level,
      timestamp: pino.stdTimeFunctions.isoTime,
      redact: { paths: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]', '*.password', '*.secret', 'err.parameters', 'err.*.parameters'], censor: '[redacted]' },
      serializers: {
        req: (r: { method: string; url: string; ip: string }) => ({ method: r.method, url: r.url.split('?')[0], ip: r.ip }),
        res: (r: { statusCode: number }) => ({ statusCode: r.statusCode }),
      },
    },
    destination as DestinationStream,
  );
}

export class PinoNestLogger implements LoggerService {
  constructor(private readonly logger: Logger) {}

  private write(level: 'info' | 'error' | 'warn' | 'debug' | 'trace' | 'fatal', message: unknown, rest: unknown[]): void {
    const where = typeof rest.at(-1) === 'string' ? rest.at(-1) : undefined;
    const fields = { where, reqId: requestContext.getStore()?.requestId };
    if (message instanceof Error) this.logger[level]({ ...fields, err: message }, message.message);
    else this.logger[level](fields, String(message));
  }

  log(message: unknown, ...rest: unknown[]): void {
    this.write('info', message, rest);
  }
  error(message: unknown, ...rest: unknown[]): void {
    this.write('error', message, rest);
  }
  warn(message: unknown, ...rest: unknown[]): void {
    this.write('warn', message, rest);
  }
  debug(message: unknown, ...rest: unknown[]): void {
    this.write('debug', message, rest);
  }
  verbose(message: unknown, ...rest: unknown[]): void {
    this.write('trace', message, rest);
  }
  fatal(message: unknown, ...rest: unknown[]): void {
    this.write('fatal', message, rest);
  }
}
