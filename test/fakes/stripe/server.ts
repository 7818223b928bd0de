import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { answerApi, type Call } from './api/answer';
import { control, controlSchema } from './control';
import { answerHosted } from './hosted/answer';
import { ApiError } from './errors';
import type { World } from './world';

const LARGEST_BODY = 1_000_000;

export function makeServer(world: World, calls: Call[]): Server {
  return createServer((request, response) => {
    answer(world, calls, request, response).catch((error: unknown) => {
      world.settings.log(`The stand-in itself failed: ${error instanceof Error ? error.stack : String(error)}`);
      if (!response.headersSent)
        sendJson(response, 500, { error: { type: 'api_error', message: 'The stand-in itself failed.' } });
    });
  });
}

async function answer(world: World, calls: Call[], request: IncomingMessage, response: ServerResponse): Promise<void> {
  const url = new URL(request.url ?? '/', 'http://stand-in');
  const body = await bodyOf(request);
  if (body === undefined)
    return sendJson(response, 413, { error: { type: 'invalid_request_error', message: 'Too large.' } });
  if (url.pathname === '/_control') return answerControl(world, request, response, body);
  if (url.pathname.startsWith('/pay/')) {
    return answerHosted(world, { method: request.method ?? 'GET', path: url.pathname, body, response });
  }
  calls.push(await answerApi(world, { request, response, url, body }));
}

async function answerControl(
  world: World,
  request: IncomingMessage,
  response: ServerResponse,
  body: string,
): Promise<void> {
  // Asking for JSON keeps a foreign page's form from throwing the switches.
  if (request.method !== 'POST' || !request.headers['content-type']?.startsWith('application/json')) {
    return sendJson(response, 405, { message: 'POST one order as application/json.' });
  }
  const order = controlSchema.safeParse(parsed(body));
  if (!order.success) return sendJson(response, 400, { message: 'This is not an order.', issues: order.error.issues });
  try {
    sendJson(response, 200, await control(world, order.data));
    world.save();
  } catch (error) {
    const status = error instanceof ApiError ? error.status : 400;
    sendJson(response, status, { message: error instanceof Error ? error.message : String(error) });
  }
}

async function bodyOf(request: IncomingMessage): Promise<string | undefined> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request) {
    const piece = Buffer.from(chunk);
    size += piece.length;
    if (size > LARGEST_BODY) return undefined;
    chunks.push(piece);
  }
  return Buffer.concat(chunks).toString('utf8');
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json);
  } catch {
    return undefined;
  }
}

function sendJson(response: ServerResponse, status: number, body: object): void {
  response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(body));
}
