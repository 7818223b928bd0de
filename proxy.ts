import { randomBytes } from 'node:crypto';
import { type NextRequest, NextResponse } from 'next/server';
import { env } from '@/services/env';

/**
 * Security headers and the content security policy, with a nonce of its own for each request. It decides nothing:
 * every page, action and route asks for itself who may do what.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = randomBytes(16).toString('base64');
  const policy = contentSecurityPolicy(nonce);
  const headers = cleaned(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('content-security-policy', policy);
  // A page is not told its own address; it needs it to come back after signing in.
  headers.set('x-path', request.nextUrl.pathname + request.nextUrl.search);

  const response = NextResponse.next({ request: { headers } });
  response.headers.set('Content-Security-Policy', policy);
  for (const [name, value] of Object.entries(fixedHeaders)) response.headers.set(name, value);
  if (env().COILYARD_URL.startsWith('https:')) {
    response.headers.set('Strict-Transport-Security', 'max-age=63072000; includeSubDomains');
  }
  return response;
}

/**
 * All but the webhook, whose body must reach its handler untouched, and the build's own files; `next.config.mjs` gives
 * those their headers.
 */
export const config = { matcher: ['/((?!api/stripe$|_next/static/).*)'] };

const fixedHeaders = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), microphone=(), geolocation=(), payment=(), usb=(), serial=(), browsing-topics=()',
};

/** What only Next and this file may say about a request is taken out of what came in. */
function cleaned(incoming: Headers): Headers {
  const headers = new Headers(incoming);
  for (const name of [...headers.keys()]) {
    if (name.startsWith('x-middleware-')) headers.delete(name);
  }
  for (const name of ['next-resume', 'x-nonce', 'x-path', 'content-security-policy']) headers.delete(name);
  return headers;
}

/** Where the browser goes to pay: the stand-in where one is named, else the provider's own page. */
const payOrigin = () => {
  const { STRIPE_API_HOST } = env();
  return STRIPE_API_HOST === undefined ? 'https://checkout.stripe.com' : `http://${STRIPE_API_HOST}`;
};

function contentSecurityPolicy(nonce: string): string {
  const isDevelopment = process.env.NODE_ENV === 'development';
  const rules = {
    'default-src': "'none'",
    // Development refreshes code by evaluating it; a built product never does.
    'script-src': `'nonce-${nonce}' 'strict-dynamic'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    'style-src': `'self' ${isDevelopment ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    'img-src': "'self' data: blob:",
    'font-src': "'self'",
    'connect-src': "'self'",
    'worker-src': "'self'",
    'manifest-src': "'self'",
    'object-src': "'none'",
    'base-uri': "'none'",
    'form-action': `'self' ${payOrigin()}`,
    'frame-ancestors': "'none'",
  };
  return Object.entries(rules)
    .map(([name, value]) => `${name} ${value}`)
    .join('; ');
}
