import { randomBytes } from 'node:crypto';
import NextAuth, { type NextAuthOptions } from 'next-auth';
import { decode } from 'next-auth/jwt';
import CredentialsProvider from 'next-auth/providers/credentials';
import { cookies, headers } from 'next/headers';
import { cache } from 'react';
import { z } from 'zod';
import { type Actor, visitor } from '../access';
import { env } from '../env';
import { PersonId, newId, newToken } from '../ids';
import { log } from '../log';
import { Problem } from '../problem';
import { now, reading } from '../record';
import { days } from '../time';
import { TooSoon, sessionKey } from './attempts';
import { endSession } from './end-sessions';
import * as rows from './rows';
import { firstScreen, life, safePath } from './rules';
import { deviceMark } from './secrets';
import { signInDemo } from './sign-in-demo';
import { signInWithLink } from './sign-in-with-link';
import { signInWithPassword } from './sign-in-with-password';
import type { Visit } from './visit';

/**
 * All that knows next-auth. Its session is a sealed cookie that says who and which; whether that still counts is read
 * from the database on every request, so that a session ends when its person changes, leaves or signs out.
 */

/** What a session cookie carries. `endsAt` is its own end, however often the cookie is written anew. */
const Claims = z.object({
  personId: PersonId,
  version: z.int(),
  sessionId: z.string().min(20),
  endsAt: z.int(),
});
type Claims = z.infer<typeof Claims>;

const isSecure = () => env().COILYARD_URL.startsWith('https:');
/** Browsers keep a `__Host-` cookie to this host and to encrypted lines; plain http is for one's own machine only. */
const cookieName = (name: string) => `${isSecure() ? '__Host-' : ''}coilyard.${name}`;
const cookieOptions = () => ({ httpOnly: true, sameSite: 'lax', path: '/', secure: isSecure() }) as const;

/** The actor of this request; a visitor when nobody is signed in or the session no longer counts. */
export const currentActor = cache(async (): Promise<Actor> => {
  const sealed = (await cookies()).get(cookieName('session'))?.value;
  return sealed ? actorOf(await openSession(sealed)) : visitor;
});

async function openSession(sealed: string): Promise<Claims | null> {
  try {
    const claims = Claims.safeParse(await decode({ token: sealed, secret: env().NEXTAUTH_SECRET }));
    return claims.success ? claims.data : null;
  } catch {
    // Not sealed by us, damaged or over: whatever it is, nobody comes in with it.
    return null;
  }
}

/** Whom a session stands for right now. */
export async function actorOf(claims: Claims | null): Promise<Actor> {
  if (claims === null || claims.endsAt <= now()) return visitor;
  const sql = reading();
  const person = await rows.findPerson(sql, { id: claims.personId });
  if (!person || person.disabledAt !== null || person.sessionVersion !== claims.version) return visitor;
  return (await rows.isRefused(sql, sessionKey(claims.sessionId), now())) ? visitor : rows.toActor(person);
}

/** Begins a session for a person who has just shown to be that person. */
export async function beginSession(personId: string): Promise<Claims> {
  const person = await rows.getPerson(reading(), personId);
  const length = person.kind === 'staff' ? life.staffSession : life.customerSession;
  const sessionId = randomBytes(16).toString('hex');
  return { personId: person.id, version: person.sessionVersion, sessionId, endsAt: now() + length };
}

type Credentials = Record<string, string> | undefined;

function provider(id: string, fields: readonly string[], enter: (input: Record<string, string>) => Promise<PersonId>) {
  return CredentialsProvider({
    id,
    name: id,
    credentials: Object.fromEntries(fields.map((field) => [field, { type: 'text' }])),
    async authorize(given: Credentials) {
      const input = Object.fromEntries(fields.map((field) => [field, String(given?.[field] ?? '')]));
      try {
        return { id: await enter(input) };
      } catch (error) {
        throw refusal(id, error);
      }
    },
  });
}

/** The short word that the sign-in page turns into its sentence; the cause of what is unknown stays in the log. */
function refusal(id: string, error: unknown): Error {
  if (error instanceof TooSoon) return new Error(`wait-${error.seconds}`);
  if (error instanceof Problem) {
    if (error.kind === 'busy' || error.kind === 'unavailable') return new Error('busy');
    return new Error(id === 'link' ? 'link-used' : 'CredentialsSignin');
  }
  log().error({ errorId: newId(), error }, 'sign-in failed');
  return new Error('failed');
}

const providers = () => [
  provider('password', ['email', 'password', 'code'], async ({ email = '', password = '', code = '' }) => {
    const jar = await cookies();
    const device = jar.get(cookieName('device'))?.value ?? null;
    const origin = { address: await currentAddress(), device };
    const { personId } = await signInWithPassword(visitor, { email, password, code }, origin);
    jar.set(cookieName('device'), deviceMark(personId), { ...cookieOptions(), maxAge: days(365) / 1000 });
    return personId;
  }),
  provider('link', ['token', 'forgetPassword'], async ({ token = '', forgetPassword }) => {
    const browser = (await cookies()).get(cookieName('browser'))?.value ?? '';
    return (await signInWithLink(visitor, { token, forgetPassword: forgetPassword === 'yes' }, browser)).personId;
  }),
  ...(env().COILYARD_DEMO === '1'
    ? [
        provider('demo', ['personId'], async ({ personId = '' }) => {
          return (await signInDemo(visitor, { personId })).personId;
        }),
      ]
    : []),
];

export function authOptions(): NextAuthOptions {
  // next-auth reads its own address from this variable only.
  process.env['NEXTAUTH_URL'] = env().COILYARD_URL;
  const cookie = (name: string) => ({ name: cookieName(name), options: cookieOptions() });
  return {
    secret: env().NEXTAUTH_SECRET,
    providers: providers(),
    session: { strategy: 'jwt', maxAge: life.customerSession / 1000 },
    cookies: { sessionToken: cookie('session'), callbackUrl: cookie('callback'), csrfToken: cookie('csrf') },
    pages: { signIn: '/sign-in', signOut: '/account', error: '/sign-in' },
    callbacks: {
      // What next-auth would put in of itself (name, address) stays out.
      jwt: async ({ token, user }) => (user ? { ...(await beginSession(user.id)) } : token),
      session: ({ session }) => ({ expires: session.expires }),
      redirect: ({ url, baseUrl }) =>
        baseUrl + (safePath(url.startsWith(baseUrl) ? url.slice(baseUrl.length) : url) ?? '/'),
    },
    events: {
      signOut: async ({ token }) => {
        const claims = Claims.safeParse(token);
        if (claims.success) await endSession(await actorOf(claims.data), claims.data);
      },
    },
    logger: {
      error: (code) => log().error({ code }, 'next-auth'),
      warn: (code) => log().warn({ code }, 'next-auth'),
      debug: () => undefined,
    },
  };
}

/** The answers of next-auth that the product uses; everything else under its address is not there. */
const answered = new Set(['GET csrf', 'GET providers', 'POST callback', 'POST signout']);

/** Answers `/api/auth/...`. The edge has checked where a POST comes from. */
export async function answerAuth(request: Request, parts: readonly string[]): Promise<Response> {
  if (!answered.has(`${request.method} ${parts[0] ?? ''}`)) return new Response(null, { status: 404 });
  const handler: (request: Request, context: unknown) => Promise<Response> = NextAuth(authOptions());
  const response = await handler(request, { params: { nextauth: [...parts] } });
  response.headers.set('Cache-Control', 'no-store');
  if (request.method === 'POST' && parts[0] === 'signout')
    response.headers.set('Clear-Site-Data', '"cache", "storage"');
  return response;
}

/** The browser that asks for a link, marked by a cookie of its own for a day. Only inside an action. */
export async function currentVisit(): Promise<Visit> {
  const jar = await cookies();
  const browser = jar.get(cookieName('browser'))?.value ?? newToken();
  jar.set(cookieName('browser'), browser, { ...cookieOptions(), maxAge: days(1) / 1000 });
  return { browser, address: await currentAddress() };
}

/** The nearest proxy writes the last entry; earlier ones come from the caller and prove nothing. */
export async function currentAddress(): Promise<string> {
  const chain = (await headers()).get('x-forwarded-for') ?? '';
  return chain.split(',').at(-1)?.trim().slice(0, 200) || 'unknown';
}

/** Where somebody goes after signing in: the page asked for, or the person's own first screen. */
export function afterSignIn(actor: Actor, next: string | null): string | null {
  if (actor.kind === 'visitor' || actor.kind === 'system') return null;
  const asked = safePath(next);
  return asked ?? firstScreen({ kind: actor.kind, roles: actor.kind === 'staff' ? actor.roles : [] });
}
