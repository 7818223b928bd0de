import { NextRequest } from 'next/server';
import { beforeAll, describe, expect, it } from 'vitest';
import { limitedText, problemResponse } from '@/app/endpoint';
import { refuseForeign } from '@/app/own-request';
import { TooSoon } from '@/services/people/attempts';
import { forbidden, invalid, missing, refused, tooLarge } from '@/services/problem';
import { config, proxy } from '@/proxy';
import { POST as event } from '@/app/api/stripe/route';
import { GET as unknown } from '@/app/api/[...path]/route';

beforeAll(() => {
  Object.assign(process.env, {
    COILYARD_DATABASE: 'none',
    COILYARD_URL: 'https://yard.example',
    NEXTAUTH_SECRET: 'a secret that only the tests of the yard know',
    STRIPE_SECRET_KEY: 'sk_test_coilyard',
    STRIPE_WEBHOOK_SECRET: 'whsec_test_coilyard',
    SMTP_HOST: '127.0.0.1',
    SMTP_PORT: '1025',
    MAIL_FROM: 'Coilyard <yard@coilyard.example>',
    LOG_LEVEL: 'silent',
  });
});

describe('a change that a browser asks for', () => {
  const asked = (headers: Record<string, string>) => () =>
    refuseForeign(new Headers({ host: 'yard.example', ...headers }));
  const own = 'https://yard.example';

  it.each<[string, Record<string, string>]>([
    ['a page of ours', { origin: own, 'sec-fetch-site': 'same-origin' }],
    ['a page of ours in an older browser', { origin: own }],
    ['the address bar with a form kept there', { origin: own, 'sec-fetch-site': 'none' }],
  ])('is taken from %s', (_from, headers) => {
    expect(asked(headers)).not.toThrow();
  });

  it.each<[string, Record<string, string>]>([
    ['nobody says where', {}],
    ['nobody says where, in a new browser', { 'sec-fetch-site': 'same-origin' }],
    ['a page that hides where it is', { origin: 'null' }],
    ['a page that hides where it is but claims to be ours', { origin: 'null', 'sec-fetch-site': 'same-origin' }],
    ['another site', { origin: 'https://evil.example', 'sec-fetch-site': 'cross-site' }],
    ['another site in an older browser', { origin: 'https://evil.example' }],
    ['another host of our own site', { origin: 'https://other.yard.example', 'sec-fetch-site': 'same-site' }],
    ['our origin by way of another site', { origin: own, 'sec-fetch-site': 'cross-site' }],
    ['our host over an open line', { origin: 'http://yard.example' }],
    ['our host on another port', { origin: 'https://yard.example:8443' }],
    ['a host that begins like ours', { origin: 'https://yard.example.evil.example' }],
    ['what is no origin at all', { origin: 'yard.example' }],
  ])('is refused from %s', (_from, headers) => {
    expect(asked(headers)).toThrow(/did not come from a page of ours/);
  });
});

describe('every page', () => {
  const visit = (headers: Record<string, string> = {}) =>
    proxy(new NextRequest('https://yard.example/orders?page=2', { headers }));
  const policyOf = (response: Response) => response.headers.get('content-security-policy') ?? '';
  const passedOn = (response: Response, name: string) => response.headers.get(`x-middleware-request-${name}`);

  it('runs scripts of ours only, by a nonce that is never the same twice', () => {
    const nonces = [visit(), visit()].map((response) => /'nonce-([^']+)'/.exec(policyOf(response))?.[1]);
    expect(nonces[0]).not.toBe(nonces[1]);
    expect(nonces[0]).toMatch(/^[\w+/]{22}==$/);
    const policy = policyOf(visit());
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).toContain("form-action 'self' https://checkout.stripe.com");
    expect(policy).not.toMatch(/unsafe|\*/);
  });

  it('is kept out of frames, off open lines, and tells other sites nothing', () => {
    const { headers } = visit();
    expect(headers.get('strict-transport-security')).toMatch(/max-age=63072000; includeSubDomains/);
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
  });

  it('learns its own address and nonce from us, whatever the request claims', () => {
    const response = visit({
      'x-nonce': 'chosen',
      'x-path': '/elsewhere',
      'content-security-policy': "script-src 'nonce-chosen'",
      'x-middleware-subrequest': 'proxy',
      'next-resume': '1',
    });
    expect(passedOn(response, 'x-path')).toBe('/orders?page=2');
    expect(passedOn(response, 'x-nonce')).not.toBe('chosen');
    expect(passedOn(response, 'content-security-policy')).toBe(policyOf(response));
    const kept = response.headers.get('x-middleware-override-headers') ?? '';
    expect(kept).not.toMatch(/x-middleware-subrequest|next-resume/);
  });
});

describe('a problem on the wire', () => {
  it.each([
    [invalid('Two fields.', { name: 'Write the name.' }), 400],
    [refused('Two stops stand.'), 409],
    [missing('Not here.'), 404],
    [forbidden('Not with these roles.'), 403],
    [tooLarge('Send less at once.'), 413],
  ])('says %s with its own status', async (problem, status) => {
    const response = problemResponse(problem);
    expect(response.status).toBe(status);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toMatchObject({ status, detail: problem.message, title: expect.any(String) });
  });

  it('says how long to wait', () => {
    const response = problemResponse(new TooSoon(4200));
    expect([response.status, response.headers.get('retry-after')]).toEqual([429, '5']);
  });

  it('keeps what went wrong inside to itself and gives a number instead', async () => {
    const response = problemResponse(new Error('SELECT secret FROM people'));
    const body = await response.text();
    expect(response.status).toBe(500);
    expect(body).not.toContain('SELECT');
    expect(JSON.parse(body)).toMatchObject({ instance: expect.stringMatching(/^\w{26}$/) });
  });
});

it('a body is read no further than its limit, whatever length it claims', async () => {
  const endless = new ReadableStream<Uint8Array>({
    pull: (controller) => controller.enqueue(new Uint8Array(1000).fill(97)),
  });
  const init: RequestInit & { duplex: 'half' } = { method: 'POST', body: endless, duplex: 'half' };
  await expect(limitedText(new Request('https://yard.example/x', init), 5000)).rejects.toThrow(/longer than 5000/);
  const small = new Request('https://yard.example/x', { method: 'POST', body: 'güt' });
  expect(await limitedText(small, 5000)).toBe('güt');
});

it('an event of the payment provider is read no further than its limit', async () => {
  const long = new Request('https://yard.example/api/stripe', { method: 'POST', body: 'x'.repeat(600_000) });
  expect((await event(long)).status).toBe(413);
});

it('an address of the API that is not there is a problem too', async () => {
  const answer = unknown();
  expect([answer.status, answer.headers.get('content-type')]).toEqual([404, 'application/problem+json']);
});

it('every address but the webhook and the build’s own files passes by the headers', () => {
  const passes = (path: string) => config.matcher.some((pattern) => new RegExp(`^${pattern}$`).test(path));
  expect(['/', '/desk', '/api/v1/parts', '/api/stripes', '/api/stripe/x', '/_next/image', '/_next/staticx']).toSatisfy(
    (paths: string[]) => paths.every(passes),
  );
  expect(['/api/stripe', '/_next/static/chunks/a.js'].filter(passes)).toEqual([]);
});
