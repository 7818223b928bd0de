import 'server-only';
import { z } from 'zod';

const port = z.coerce.number().int().min(1).max(65_535);
const flag = z.enum(['0', '1']).default('0');

/** Every variable the product reads. `.env.example` and README describe each one. */
const Env = z
  .object({
    COILYARD_DATABASE: z.string().min(1),
    COILYARD_URL: z.url(),
    NEXTAUTH_SECRET: z.string().min(32, 'must hold at least 32 random characters'),
    STRIPE_SECRET_KEY: z.string().regex(/^sk_/, 'must be a secret key, which begins with sk_'),
    STRIPE_WEBHOOK_SECRET: z.string().regex(/^whsec_/, 'must be a signing secret, which begins with whsec_'),
    /** Host of a stand-in, "127.0.0.1:12111"; absent in a real installation. */
    STRIPE_API_HOST: z
      .string()
      .regex(/^[\w.-]+:\d+$/, 'must be host:port')
      .optional(),
    SMTP_HOST: z.string().min(1),
    SMTP_PORT: port,
    SMTP_USER: z.string().optional(),
    SMTP_PASSWORD: z.string().optional(),
    MAIL_FROM: z.string().min(3),
    /** 1 shows the page of demo sign-ins; never in a real installation. */
    COILYARD_DEMO: flag,
    LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  })
  .refine((env) => env.COILYARD_DEMO === '0' || env.STRIPE_API_HOST !== undefined, {
    path: ['COILYARD_DEMO'],
    message: 'must be 0 where real payments are taken (STRIPE_API_HOST is not set)',
  });
export type Env = z.infer<typeof Env>;

/** Says in one sentence a variable what is missing or wrong. */
export function parseEnv(source: Record<string, string | undefined>): Env {
  const present = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== undefined && value !== ''));
  const result = Env.safeParse(present);
  if (result.success) return result.data;
  const sentences = result.error.issues.map((issue) => {
    const name = issue.path.join('.');
    return present[name] === undefined
      ? `${name} is not set: add it to the environment (README, "A real installation").`
      : `${name} ${issue.message}.`;
  });
  throw new Error(`Coilyard cannot start. ${sentences.join(' ')}`);
}

let parsed: Env | undefined;

/** The configuration, read once. */
export function env(): Env {
  parsed ??= parseEnv(process.env);
  return parsed;
}
