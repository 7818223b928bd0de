import { jsonBody, problemResponse } from '@/app/endpoint';
import { evaluateDesign } from '@/services/kits';
import { currentActor } from '@/services/people';
import { Problem } from '@/services/problem';

/** A design file in, its verdict out, whatever its outcome; 422 with every issue where it cannot be evaluated. */
export async function POST(request: Request): Promise<Response> {
  try {
    const query = Object.fromEntries(new URL(request.url).searchParams);
    const verdict = await evaluateDesign(await currentActor(), { design: await jsonBody(request), query });
    return Response.json(verdict, { headers: { 'Cache-Control': 'no-store' } });
  } catch (error) {
    if (!(error instanceof Problem) || error.kind !== 'invalid') return problemResponse(error);
    const issues = Object.entries(error.fields ?? {}).map(([path, message]) => ({ path, message }));
    const body = {
      type: 'tag:coilyard.example,2026:problem:invalid',
      title: error.message,
      status: 422,
      detail: error.message,
      issues,
    };
    return new Response(JSON.stringify(body), {
      status: 422,
      headers: { 'Content-Type': 'application/problem+json', 'Cache-Control': 'no-store' },
    });
  }
}
