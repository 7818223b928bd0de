import 'server-only';
import pino from 'pino';

let logger: pino.Logger | undefined;

/** JSON lines without addresses, tokens or card data: a log line names things by id. */
export function log(): pino.Logger {
  logger ??= pino({
    level: process.env['LOG_LEVEL'] ?? 'info',
    redact: ['password', '*.password', 'token', '*.token', 'email', '*.email', 'code', '*.code'],
  });
  return logger;
}
