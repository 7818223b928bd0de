import { renderToBuffer } from '@react-pdf/renderer';
import { GuidePaper } from '@/templates/documents/guide';
import { InvoicePaper } from '@/templates/documents/invoice';
import { LabelPaper } from '@/templates/documents/label';
import { SlipPaper } from '@/templates/documents/slip';
import { loadFonts } from './fonts';
import type { PrintTask } from './paper';

/** Sets a paper and returns the bytes of its PDF. Takes its time: in the product this runs in a thread of its own. */
export async function renderPdf({ paper, size }: PrintTask): Promise<Uint8Array> {
  await loadFonts();
  return new Uint8Array(await renderToBuffer(pages({ paper, size })));
}

function pages({ paper, size }: PrintTask) {
  switch (paper.kind) {
    case 'guide':
      return <GuidePaper view={paper.view} size={size} />;
    case 'slip':
      return <SlipPaper view={paper.view} size={size} />;
    case 'label':
      return <LabelPaper view={paper.view} />;
    case 'invoice':
      return <InvoicePaper view={paper.view} size={size} />;
  }
}
