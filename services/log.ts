import 'server-only';
import pino from 'pino';

let logger: pino.Logger | undefined;

/** JSON lines without addresses, tokens or card data: a log line names things by id. */
export function log(): pino.Logger {
  logger ??= pino({
    level: process.env['LOG_LEVEL'] ?? 'info',
    redact: ['password', '*.password', 'token', '*.token', 'email', '*.email', 'code', '*.code'],
    serializers: { error: loggedError },
  });
  return logger;
}

/** What a log line keeps of an error: its kind, what it says and where it was thrown. */
export function loggedError(error: unknown): unknown {
  if (!(error instanceof Error)) return error;
  const [, ...frames] = (error.stack ?? '').slice(error.stack?.indexOf('\n    at ') ?? 0).split('\n    at ');
  return {
    name: error.name,
    message: withoutValues(error.message),
    cause: 'code' in error ? error.code : undefined,
    at: frames.slice(0, 8),
  };
}

/** The database client repeats a statement with its values before it says what was wrong; mails repeat addresses. */
const withoutValues = (message: string) =>
  message.replace(/^.*[`"].* - (?=[^`"]*$)/s, '').replace(/[^\s<>@"]+@[^\s<>@"]+/g, '(address)');
