import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { GuideEditor } from '@/components/bench/guide-editor';
import { can } from '@/services/access';
import { readVersion } from '@/services/kits';
import { addLine, removeLine, saveCircuit, saveGuide, saveLine, startVersion } from '../../actions';

interface Props {
  params: Promise<{ versionId: string }>;
}

/** Once a request, for the title and the page. */
const load = cache((versionId: string) =>
  view(async (actor) => ({
    version: await readVersion(actor, versionId),
    mayEdit: can(actor, 'version.edit'),
  })),
);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { version } = await load((await params).versionId);
  const { kit } = version.content;
  return { title: `${kit.name} ${kit.number} ${version.letter}, build guide` };
}

export default async function GuidePage({ params }: Props) {
  const { version, mayEdit } = await load((await params).versionId);
  return (
    <GuideEditor
      key={`${version.id} ${version.state}`}
      view={version}
      mayEdit={mayEdit}
      deeds={{ addLine, saveLine, removeLine, saveCircuit, saveGuide }}
      startVersion={startVersion}
    />
  );
}
