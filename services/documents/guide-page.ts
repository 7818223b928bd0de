import type { Actor } from '../access';
import { missing } from '../problem';
import { readGuide } from './kinds';
import { type GuideView, RenderPaper } from './schemas';

/** The guide of a box as data: the page of equal content beside the PDF, for readers that need headings and tables. */
export async function readGuidePage(
  actor: Actor,
  { boxId, key }: { boxId: string; key?: string | undefined },
): Promise<GuideView> {
  const asked = RenderPaper.safeParse({ kind: 'guide', id: boxId, ...(key !== undefined && { key }) });
  if (!asked.success) throw missing('There is no such guide. Open it from your order.');
  return readGuide(actor, asked.data);
}
