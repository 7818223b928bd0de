import type { IncomingMessage, ServerResponse } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import Stripe from 'stripe';
import { ApiError, broken, noKey, tooManyRequests, unknownUrl } from '../errors';
import { claim, forget, remember, type Answer } from '../idempotency';
import { newId } from '../identifiers';
import type { ApiFault } from '../switches';
import type { World } from '../world';
import { expanded } from './expand';
import { decodeForm, type FormTree } from './form';
import { matches, type Route } from './route';
import { ROUTES } from './routes';

/** What a test may want to know of a call that arrived. */
export interface Call {
  method: string;
  path: string;
  key: string | null;
  requestId: string;
  /** The request whose answer this is: its own, or the first one under the key. */
  original: string;
  /** null: the caller never got a whole answer. */
  status: number | null;
  replayed: boolean;
}

interface Incoming {
  request: IncomingMessage;
  response: ServerResponse;
  url: URL;
  body: string;
}

export async function answerApi(world: World, { request, response, url, body }: Incoming): Promise<Call> {
  const method = request.method ?? 'GET';
  const header = request.headers['idempotency-key'];
  const key = method === 'POST' && typeof header === 'string' && header !== '' ? header : null;
  const requestId = newId('req', 14);
  const call: Call = { method, path: url.pathname, key, requestId, original: requestId, status: null, replayed: false };
  const fault = world.faults.next(url.pathname);
  if (fault === 'reset') return cut(response, call);
  if (fault === 'silent') return call;
  if (fault === 'wrong-json') return send(response, call, 200, '<html><body>Bad gateway</body></html>');

  const answer = await answerTo(world, call, {
    request,
    tree: decodeForm(method === 'GET' ? url.search : body),
    fault,
  });
  world.save();
  if (fault === 'work-then-reset') return cut(response, call);
  if (fault === 'work-then-silent') return call;
  const json = JSON.stringify(answer.body, null, 2);
  if (fault === 'half-body') {
    response.writeHead(answer.status, {
      'content-type': 'application/json',
      'content-length': Buffer.byteLength(json),
    });
    response.write(json.slice(0, json.length / 2), () => response.destroy());
    return call;
  }
  return send(response, call, answer.status, json);
}

interface Question {
  request: IncomingMessage;
  tree: FormTree;
  fault: ApiFault;
}

async function answerTo(world: World, call: Call, { request, tree, fault }: Question): Promise<Answer> {
  const { key, path, requestId } = call;
  let claimed = false;
  try {
    checkKey(request);
    if (fault === 'rate-limit-429') throw tooManyRequests();
    if (fault === 'outage-503') throw broken(503);
    const found = routeFor(call);
    const known = key === null ? undefined : claim(world, { key, path, tree, requestId });
    if (known?.answer) {
      call.replayed = true;
      call.original = known.requestId;
      return known.answer;
    }
    claimed = key !== null;
    const work = found.route.prepare(tree);
    if (world.switches.apiDelayMs > 0) await wait(world.switches.apiDelayMs);
    const answer = outcomeOf(() => {
      if (fault === 'error-500') throw broken();
      return expanded(world, work(world, found.id), expansionsOf(tree));
    });
    if (key !== null) remember(world, key, answer);
    return answer;
  } catch (error) {
    if (claimed && key !== null) forget(world, key);
    if (error instanceof ApiError) return refusal(error);
    throw error;
  }
}

/** An error of the work itself is an answer like any other and is replayed as one. */
function outcomeOf(work: () => object): Answer {
  try {
    return { status: 200, body: work() };
  } catch (error) {
    if (error instanceof ApiError) return refusal(error);
    throw error;
  }
}

function refusal(error: ApiError): Answer {
  return { status: error.status, body: { error: error.body } };
}

function checkKey(request: IncomingMessage): void {
  const given = /^Bearer (.+)$/.exec(request.headers.authorization ?? '')?.[1] ?? '';
  if (!/^sk_test_\w+$/.test(given)) throw noKey(given);
}

function routeFor({ method, path }: Call): { route: Route; id: string } {
  for (const route of ROUTES) {
    const match = matches(route, method, path);
    if (match) return { route, id: match.id };
  }
  throw unknownUrl(method, path);
}

function expansionsOf(tree: FormTree): string[] {
  const asked = typeof tree === 'object' && !Array.isArray(tree) ? tree['expand'] : undefined;
  return Array.isArray(asked) ? asked.filter((path) => typeof path === 'string') : [];
}

function send(response: ServerResponse, call: Call, status: number, body: string): Call {
  call.status = status;
  response.writeHead(status, {
    'content-type': 'application/json',
    'content-length': Buffer.byteLength(body),
    'request-id': call.requestId,
    'stripe-version': Stripe.API_VERSION,
    ...(call.key !== null && { 'idempotency-key': call.key, 'original-request': call.original }),
    ...(call.replayed && { 'idempotent-replayed': 'true' }),
    ...(status === 429 && { 'retry-after': '1' }),
  });
  response.end(body);
  return call;
}

function cut(response: ServerResponse, call: Call): Call {
  response.socket?.resetAndDestroy();
  return call;
}
