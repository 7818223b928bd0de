import type { Invoice } from '../orders/schemas';
import type { GuideView, LabelView, PaperSize, SlipView } from './schemas';

/** What is to be printed, as plain data: it crosses into the thread that sets it. */
export type Paper =
  | { kind: 'guide'; view: GuideView }
  | { kind: 'slip'; view: SlipView }
  | { kind: 'label'; view: LabelView }
  | { kind: 'invoice'; view: Invoice };

export interface PrintTask {
  paper: Paper;
  size: PaperSize;
}
