import { type Actor } from '../access';
import { evaluateApart } from '../kits';
import { readInvoice } from '../orders';
import { type BoxPapers, readBoxPapers } from '../packing';
import type { Contour, Verdict } from '../receiver';
import { guideView } from './guide-view';
import type { Paper } from './paper';
import type { GuideView, PaperKind } from './schemas';
import { labelView, slipView } from './slip-view';

interface Asked {
  id: string;
  key?: string | undefined;
}

export interface Read {
  paper: Paper;
  filename: string;
  /** Made from frozen content only, so the same bytes may be handed out again. */
  frozen: boolean;
}

/** A document: read it (and refuse whoever may not have it), name it. What it looks like is its template's matter. */
export const kinds: Record<PaperKind, (actor: Actor, asked: Asked) => Promise<Read>> = {
  guide: async (actor, { id, key }) => {
    const view = await readGuide(actor, { id, key });
    return { paper: { kind: 'guide', view }, filename: `guide-${view.serial}.pdf`, frozen: true };
  },
  slip: async (actor, { id, key }) => {
    const papers = await readBoxPapers(actor, { boxId: id, paper: 'slip', key });
    const { verdict, chance } = await figuresOf(papers);
    return {
      paper: { kind: 'slip', view: slipView(papers, verdict, chance) },
      filename: `slip-${papers.serial}.pdf`,
      frozen: false,
    };
  },
  label: async (actor, { id, key }) => {
    const papers = await readBoxPapers(actor, { boxId: id, paper: 'label', key });
    return { paper: { kind: 'label', view: labelView(papers) }, filename: `label-${papers.serial}.pdf`, frozen: false };
  },
  invoice: async (actor, { id, key }) => {
    const view = await readInvoice(actor, { invoiceId: id, key });
    return { paper: { kind: 'invoice', view }, filename: `invoice-${view.number}.pdf`, frozen: true };
  },
};

/** The guide of a box as data, for the PDF and for the page of equal content beside it. */
export async function readGuide(actor: Actor, { id, key }: Asked): Promise<GuideView> {
  const papers = await readBoxPapers(actor, { boxId: id, paper: 'guide', key });
  const { verdict, chance } = await figuresOf(papers);
  return guideView(papers, verdict, chance);
}

/**
 * The figures on a paper are those that were signed. The chance drawn over the rail is no part of a verdict; it is
 * worked out anew from the same frozen content, and the same content gives the same chance.
 */
async function figuresOf({ content, verdict }: BoxPapers): Promise<{ verdict: Verdict; chance: Contour | null }> {
  const now = await evaluateApart(content, { boxes: 0, seed: 1, withContour: true });
  return { verdict: verdict ?? now.verdict, chance: now.contour };
}
