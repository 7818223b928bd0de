import { isDatabaseOpen } from '@/services/record';

/** For whoever watches over the product: does it answer, and does its database. */
export async function GET(): Promise<Response> {
  const ok = await isDatabaseOpen();
  return Response.json({ ok }, { status: ok ? 200 : 503, headers: { 'Cache-Control': 'no-store' } });
}
