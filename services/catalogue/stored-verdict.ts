import { z } from 'zod';
import type { VersionContent } from '../kits/schemas';
import type { Reach } from './schemas';

const Span = z.object({ lo: z.number(), hi: z.number() });

/** What the shop reads of the verdict that was stored with the frozen content. */
const StoredVerdict = z.object({
  reach: z.object({ nominal: Span, corners: Span }),
  share: z.object({ covered: z.int(), boxes: z.int() }).nullable(),
});
export type StoredVerdict = z.infer<typeof StoredVerdict>;

export function readVerdict(text: string | null): StoredVerdict | null {
  if (text === null) return null;
  const result = StoredVerdict.safeParse(JSON.parse(text));
  return result.success ? result.data : null;
}

/** The rail of a version. Its brackets stand at the first and last carrier, which is what a buyer can tune to. */
export function reachOf(verdict: StoredVerdict | null, content: Pick<VersionContent, 'kit'>): Reach | null {
  if (!verdict) return null;
  const { firstCarrier, lastCarrier } = content.kit.band;
  return {
    band: { lo: firstCarrier, hi: lastCarrier },
    nominal: verdict.reach.nominal,
    worst: verdict.reach.corners,
  };
}
