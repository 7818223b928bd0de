import type { Actor } from '@/services/access';
import { currentActor } from '@/services/people';
import { Problem, type ProblemKind, invalid, tooLarge } from '@/services/problem';
import { problemOf } from './problem-of';
import { refuseForeign } from './own-request';

export type RouteParams = Record<string, string | string[] | undefined>;

interface Endpoint<Input, Value> {
  deed: (actor: Actor, input: Input) => Promise<Value>;
  /** Gathers what the deed is asked; the deed parses it. */
  input: (request: Request, params: RouteParams) => Input | Promise<Input>;
}

/** Bodies of JSON stay under this; files have their own door. */
const bodyLimit = 1_048_576;

/** Makes a route handler of a deed or a read: JSON out, problems as RFC 9457 says. */
export function endpoint<Input, Value>({ deed, input }: Endpoint<Input, Value>) {
  return async (request: Request, context: { params: Promise<RouteParams> }): Promise<Response> => {
    try {
      if (request.method !== 'GET' && request.method !== 'HEAD') refuseForeign(request.headers);
      const asked = await input(request, await context.params);
      const value = await deed(await currentActor(), asked);
      return Response.json(value, { headers: { 'Cache-Control': 'no-store' } });
    } catch (error) {
      return problemResponse(error);
    }
  };
}

const titles: Record<ProblemKind, string> = {
  invalid: 'Some fields need another look',
  refused: 'Refused by a rule',
  forbidden: 'Not with these roles',
  missing: 'Not here',
  conflict: 'Changed meanwhile',
  'too-large': 'Too much at once',
  busy: 'Busy just now',
  unavailable: 'Not available just now',
};

/** Any error as application/problem+json. */
export function problemResponse(error: unknown): Response {
  const problem = problemOf(error);
  const wait = error instanceof Problem && 'seconds' in error ? Number(error.seconds) : null;
  const status = wait !== null ? 429 : error instanceof Problem ? error.status : 500;
  const body = {
    type: `tag:coilyard.example,2026:problem:${problem.kind}`,
    title: titles[problem.kind],
    status,
    detail: problem.sentence,
    ...(problem.fields && { fields: problem.fields }),
    ...(problem.current !== undefined && { current: problem.current }),
    ...(problem.id !== undefined && { instance: problem.id }),
  };
  const headers = { 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store' };
  return new Response(JSON.stringify(body), {
    status,
    headers: wait === null ? headers : { ...headers, 'Retry-After': String(wait) },
  });
}

/** The body as JSON, read no further than the limit. */
export async function jsonBody(request: Request, limit = bodyLimit): Promise<unknown> {
  const text = await limitedText(request, limit);
  try {
    const value: unknown = JSON.parse(text);
    return value;
  } catch {
    throw invalid('The body is not JSON. Send one JSON object.');
  }
}

export async function limitedText(request: Request, limit: number): Promise<string> {
  const tooLong = () => tooLarge(`The body is longer than ${limit} bytes. Send less at once.`);
  if (Number(request.headers.get('content-length') ?? 0) > limit) throw tooLong();
  if (!request.body) return '';
  const decoder = new TextDecoder();
  let text = '';
  let length = 0;
  const reader = request.body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return text + decoder.decode();
    length += value.byteLength;
    if (length > limit) {
      await reader.cancel();
      throw tooLong();
    }
    text += decoder.decode(value, { stream: true });
  }
}
