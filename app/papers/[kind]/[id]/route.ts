import { problemResponse, type RouteParams } from '@/app/endpoint';
import { renderPaper } from '@/services/documents';
import { PaperKind, RenderPaper } from '@/services/documents/schemas';
import { currentActor } from '@/services/people';
import { missing } from '@/services/problem';

/** Streams a paper as PDF: never kept by a browser or a proxy between, and never taken for anything else. */
export async function GET(request: Request, context: { params: Promise<RouteParams> }): Promise<Response> {
  try {
    const { bytes, filename, contentType } = await renderPaper(await currentActor(), await asked(request, context));
    return new Response(new Uint8Array(bytes), {
      headers: {
        'Content-Type': contentType,
        'Content-Disposition': `inline; filename="${filename}"`,
        'Content-Length': String(bytes.byteLength),
        'Cache-Control': 'private, no-store',
        'X-Content-Type-Options': 'nosniff',
        'Referrer-Policy': 'no-referrer',
      },
    });
  } catch (error) {
    return problemResponse(error);
  }
}

async function asked(request: Request, context: { params: Promise<RouteParams> }) {
  const { kind, id } = await context.params;
  const search = new URL(request.url).searchParams;
  const key = search.get('key');
  const parsed = RenderPaper.safeParse({
    kind: PaperKind.safeParse(kind).data,
    id,
    ...(search.get('size') === 'letter' && { size: 'letter' }),
    ...(key !== null && { key }),
  });
  if (!parsed.success) throw missing('There is no such paper. Open it from its box or its order.');
  return parsed.data;
}
