import { limitedText } from '@/app/endpoint';
import { log } from '@/services/log';
import { receiveEvent } from '@/services/payments';
import { Problem } from '@/services/problem';

export const runtime = 'nodejs';

/** Events are a few kilobytes; what is larger is none. */
const mostBytes = 512 * 1024;

/** The provider's events. The raw text is read first: a body that was parsed and printed again has no signature. */
export async function POST(request: Request): Promise<Response> {
  try {
    const body = await limitedText(request, mostBytes);
    await receiveEvent(body, request.headers.get('stripe-signature'));
    return answer(200);
  } catch (error) {
    if (error instanceof Problem && (error.kind === 'invalid' || error.kind === 'too-large'))
      return answer(error.status);
    // Anything else is sent again by the provider until it is taken.
    log().error({ error: String(error) }, 'an event was not taken');
    return answer(error instanceof Problem && error.kind === 'busy' ? 503 : 500);
  }
}

/** One text for each answer: nobody learns from it why. */
const answer = (status: number) => Response.json({ received: status === 200 }, { status });
