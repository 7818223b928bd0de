import type { VersionContent } from './schemas';
import { designOf } from './design-of';

/** The design file of a version, to be saved under a name of its own; null while it lacks parts. */
export function designFile(
  content: Pick<VersionContent, 'kit' | 'circuit' | 'lines' | 'letter'>,
): { name: string; text: string } | null {
  const { design } = designOf(content);
  if (design === null) return null;
  return { name: `${content.kit.number}-${content.letter}.design.json`, text: `${JSON.stringify(design, null, 2)}\n` };
}
