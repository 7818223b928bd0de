import { parseArgs } from 'node:util';
import { z } from 'zod';
import { startFakeStripe } from './start';

const USE = `Usage: tsx test/fakes/stripe/main.ts [--port 12111] [--host 127.0.0.1] [--webhook URL] [--secret whsec_...]...
  [--public-url URL] [--state FILE] [--min-expiry-seconds 1800] [--retry-ms 2000,5000,...] [--quiet]`;

/** A person who restarts the shop sees its events arrive soon, and again for some hours. */
const PATIENT_RETRIES_MS = [2_000, 5_000, 15_000, 60_000, 300_000, 900_000, 3_600_000];

const wholeNumber = z.string().regex(/^\d+$/, 'must be a whole number').transform(Number);
const flagsSchema = z.object({
  port: wholeNumber.pipe(z.number().max(65_535)).default(12_111),
  host: z.string().default('127.0.0.1'),
  webhook: z.url('must be a whole address such as http://127.0.0.1:3000/api/stripe').optional(),
  secret: z.array(z.string().startsWith('whsec_', 'must begin with whsec_')).optional(),
  'public-url': z.url('must be a whole address such as http://127.0.0.1:12111').optional(),
  state: z.string().min(1).optional(),
  'min-expiry-seconds': wholeNumber.optional(),
  'retry-ms': z
    .string()
    .regex(/^\d+(,\d+)*$/, 'must be a list of milliseconds such as 2000,5000')
    .transform((list) => list.split(',').map(Number))
    .default(PATIENT_RETRIES_MS),
  quiet: z.boolean().default(false),
});

function readFlags(): z.output<typeof flagsSchema> {
  const { values } = parseArgs({
    options: {
      port: { type: 'string' },
      host: { type: 'string' },
      webhook: { type: 'string' },
      secret: { type: 'string', multiple: true },
      'public-url': { type: 'string' },
      state: { type: 'string' },
      'min-expiry-seconds': { type: 'string' },
      'retry-ms': { type: 'string' },
      quiet: { type: 'boolean' },
    },
  });
  const flags = flagsSchema.safeParse(values);
  if (flags.success) return flags.data;
  const { path, message } = flags.error.issues[0] ?? { path: [], message: 'cannot be read' };
  throw new Error(`--${String(path[0])} ${message}.`);
}

async function main(): Promise<void> {
  const flags = readFlags();
  const fake = await startFakeStripe({
    port: flags.port,
    host: flags.host,
    retryDelaysMs: flags['retry-ms'],
    ...(flags.webhook && { webhook: flags.webhook }),
    ...(flags.secret && { secret: flags.secret }),
    ...(flags['public-url'] && { publicUrl: flags['public-url'] }),
    ...(flags.state && { stateFile: flags.state }),
    ...(flags['min-expiry-seconds'] !== undefined && { minExpirySeconds: flags['min-expiry-seconds'] }),
    ...(!flags.quiet && { log: (line: string) => console.log(`payment stand-in: ${line}`) }),
  });
  console.log(`Payment stand-in ready at ${fake.url}, events go to ${flags.webhook ?? 'nobody'}.`);
  const stop = () => void fake.close().then(() => process.exit(0));
  process.once('SIGINT', stop);
  process.once('SIGTERM', stop);
}

main().catch((error: unknown) => {
  const busy = error instanceof Error && 'code' in error && error.code === 'EADDRINUSE';
  const reason = error instanceof Error ? error.message : String(error);
  console.error(busy ? 'The port is taken. Stop what uses it, or name another with --port.' : `${reason}\n${USE}`);
  process.exit(1);
});
