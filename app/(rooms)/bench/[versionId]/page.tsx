import type { Metadata } from 'next';
import { view } from '@/app/view';
import { Workbench } from '@/components/bench/workbench';
import { can } from '@/services/access';
import { readVersion } from '@/services/kits';
import { addLine, callBack, removeLine, saveCircuit, saveGuide, saveLine, sendToCheck, startVersion } from '../actions';

export const metadata: Metadata = { title: 'Workbench' };

export default async function VersionPage({ params }: { params: Promise<{ versionId: string }> }) {
  const { versionId } = await params;
  const { version, mayEdit } = await view(async (actor) => ({
    version: await readVersion(actor, versionId),
    mayEdit: can(actor, 'version.edit'),
  }));
  const deeds = { addLine, saveLine, removeLine, saveCircuit, saveGuide, sendToCheck, callBack, startVersion };
  // A version that was sent or called back starts afresh from what the server says.
  return <Workbench key={`${version.id} ${version.state}`} view={version} mayEdit={mayEdit} deeds={deeds} />;
}
