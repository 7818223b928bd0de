import type { Metadata } from 'next';
import { cache } from 'react';
import { view } from '@/app/view';
import { Workbench } from '@/components/bench/workbench';
import { can } from '@/services/access';
import { readVersion } from '@/services/kits';
import { addLine, callBack, removeLine, saveCircuit, saveGuide, saveLine, sendToCheck, startVersion } from '../actions';

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
  return { title: `${kit.name} ${kit.number} ${version.letter}, workbench` };
}

export default async function VersionPage({ params }: Props) {
  const { version, mayEdit } = await load((await params).versionId);
  const deeds = { addLine, saveLine, removeLine, saveCircuit, saveGuide, sendToCheck, callBack, startVersion };
  // A version that was sent or called back starts afresh from what the server says.
  return <Workbench key={`${version.id} ${version.state}`} view={version} mayEdit={mayEdit} deeds={deeds} />;
}
