'use client';

import { Button } from '@/components/ui/button';
import { designFile } from '@/services/kits/rules';
import type { VersionContent } from '@/services/kits/schemas';

/** Saves the design file of a version, which the evaluation on the command line judges the same; absent while parts lack. */
export function DownloadDesign({ content }: { content: VersionContent }) {
  const file = designFile(content);
  if (file === null) return null;
  const save = () => {
    const address = URL.createObjectURL(new Blob([file.text], { type: 'application/json' }));
    const link = document.createElement('a');
    link.href = address;
    link.download = file.name;
    link.click();
    // Some browsers begin to read only after the click has been handled.
    setTimeout(() => URL.revokeObjectURL(address), 60_000);
  };
  return (
    <Button variant="quiet" size="small" icon="download" onClick={save}>
      Download the design file
    </Button>
  );
}
