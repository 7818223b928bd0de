import { SvgDrawing, type SvgDrawingProps } from '@/templates/drawings/as-svg';
import { isPartFamily, partDrawing } from '@/templates/drawings/part-drawing';

/** A part's silhouette; one without a drawing of its own is drawn as a packet. */
export function PartPicture({ family, ...rest }: { family: string } & Omit<SvgDrawingProps, 'drawing'>) {
  return <SvgDrawing drawing={partDrawing(isPartFamily(family) ? family : 'packet')} {...rest} />;
}
