import type { Metadata } from 'next';
import { view } from '@/app/view';
import { GuideEditor } from '@/components/bench/guide-editor';
import { can } from '@/services/access';
import { readVersion } from '@/services/kits';
import { addLine, removeLine, saveCircuit, saveGuide, saveLine, startVersion } from '../../actions';

export const metadata: Metadata = { title: 'Build guide' };

export default async function GuidePage({ params }: { params: Promise<{ versionId: string }> }) {
  const { versionId } = await params;
  const { version, mayEdit } = await view(async (actor) => ({
    version: await readVersion(actor, versionId),
    mayEdit: can(actor, 'version.edit'),
  }));
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
