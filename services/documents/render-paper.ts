import type { Actor } from '../access';
import { missing } from '../problem';
import { sha256 } from '../record';
import { kinds } from './kinds';
import { setPaper } from './press';
import { RenderPaper } from './schemas';

export interface PrintedPaper {
  bytes: Uint8Array;
  filename: string;
  contentType: 'application/pdf';
}

/** Papers made from frozen content, by what is on them: a guide is printed for the packer and opened by the buyer. */
const kept = new Map<string, Uint8Array>();
const KEEP = 30;

/** The bytes of one paper, for whoever may have it; everybody else learns only that there is none. */
export async function renderPaper(actor: Actor, input: RenderPaper): Promise<PrintedPaper> {
  const asked = RenderPaper.safeParse(input);
  if (!asked.success) throw missing('There is no such paper. Open it from its box or its order.');
  const { kind, id, size, key } = asked.data;
  const { paper, filename, frozen } = await kinds[kind](actor, { id, key });

  const name = frozen ? sha256(JSON.stringify({ paper, size })) : '';
  const bytes = kept.get(name) ?? (await setPaper({ paper, size }));
  if (frozen) keep(name, bytes);
  return { bytes, filename, contentType: 'application/pdf' };
}

function keep(name: string, bytes: Uint8Array): void {
  kept.set(name, bytes);
  const [oldest] = kept.keys();
  if (kept.size > KEEP && oldest !== undefined) kept.delete(oldest);
}
