import type Stripe from 'stripe';

export type ErrorBody = Pick<Stripe.StripeRawError, 'code' | 'doc_url' | 'message' | 'param' | 'type'>;

/** An answer other than 200, in the shape the provider gives: `{ error: { type, code, message, param, ... } }`. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
  ) {
    super(body.message);
  }
}

interface Detail {
  code?: string | undefined;
  param?: string | undefined;
  status?: number;
}

export function invalidRequest(message: string, { code, param, status = 400 }: Detail = {}): ApiError {
  return new ApiError(status, {
    type: 'invalid_request_error',
    ...(code && { code, doc_url: docUrl(code) }),
    message,
    ...(param && { param }),
  });
}

export function noSuch(kind: string, id: string, param = 'id'): ApiError {
  const status = param === 'id' ? 404 : 400;
  return invalidRequest(`No such ${kind}: '${id}'`, { code: 'resource_missing', param, status });
}

export function noKey(given: string): ApiError {
  const message = given
    ? `Invalid API Key provided: ${masked(given)}`
    : 'You did not provide an API key. Send it as Authorization: Bearer sk_test_...';
  return new ApiError(401, { type: 'invalid_request_error', message });
}

export function unknownUrl(method: string, path: string): ApiError {
  return invalidRequest(`Unrecognized request URL (${method}: ${path}).`, { status: 404 });
}

export function keyOfAnotherRequest(key: string, difference: 'parameters' | 'endpoint'): ApiError {
  return new ApiError(400, {
    type: 'idempotency_error',
    message: `Keys for idempotent requests can only be used with the same ${difference} they were first used with: '${key}'.`,
  });
}

export function keyInUse(key: string): ApiError {
  return invalidRequest(`Another request with the idempotent key '${key}' is still in progress.`, {
    code: 'idempotency_key_in_use',
    status: 409,
  });
}

export function tooManyRequests(): ApiError {
  return invalidRequest('Too many requests in a row. Wait a little and try again.', {
    code: 'rate_limit',
    status: 429,
  });
}

export function broken(status = 500): ApiError {
  return new ApiError(status, { type: 'api_error', message: 'Something went wrong at the provider.' });
}

export function docUrl(code: string): string {
  return `https://stripe.com/docs/error-codes/${code.replaceAll('_', '-')}`;
}

function masked(key: string): string {
  return key.length > 12 ? `${key.slice(0, 8)}${'*'.repeat(key.length - 12)}${key.slice(-4)}` : '*'.repeat(key.length);
}
