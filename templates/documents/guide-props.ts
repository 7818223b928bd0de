import type { GuideView, PaperSize } from '@/services/documents/schemas';

export interface GuideProps {
  view: GuideView;
  size: PaperSize;
}
