import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import { type PartValues, partKinds, silhouetteOf } from '@/services/parts/schemas';

/** The silhouette of a part's family, small, without a name of its own: the part's name stands beside it. */
export function PartPicture({ values, width = 52 }: { values: PartValues; width?: number }) {
  return <SvgDrawing drawing={partDrawing(silhouetteOf(values))} width={width} />;
}

export function KindPicture({ kind, width = 52 }: { kind: PartValues['kind']; width?: number }) {
  return <SvgDrawing drawing={partDrawing(partKinds[kind].silhouette)} width={width} />;
}
