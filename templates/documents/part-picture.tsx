import { isPartFamily, partDrawing } from '../drawings/part-drawing';
import { PdfDrawing, type PrintScheme } from '../drawings/as-pdf';

/** A part's silhouette, `width` in points; a family without a drawing is drawn as a packet. */
export function PartPicture({
  family,
  width,
  scheme = 'copper',
}: {
  family: string;
  width: number;
  scheme?: PrintScheme;
}) {
  return <PdfDrawing drawing={partDrawing(isPartFamily(family) ? family : 'packet')} scheme={scheme} width={width} />;
}
