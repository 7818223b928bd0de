import type { PrintReach } from '@/services/documents/schemas';
import { PdfDrawing } from '../drawings/as-pdf';
import { reachRailDrawing } from '../drawings/reach-rail-drawing';
import { measure } from './sheet';

/** The reach rail in one ink, as wide as the sheet; the drawing is made in its own points, so it keeps its line widths. */
export function Rail({ reach, width = measure }: { reach: PrintReach; width?: number }) {
  return <PdfDrawing drawing={reachRailDrawing(reach, 690)} scheme="ink" width={width} />;
}
