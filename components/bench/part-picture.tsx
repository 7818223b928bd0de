import { SvgDrawing } from '@/templates/drawings/as-svg';
import { partDrawing } from '@/templates/drawings/part-drawing';
import { type PartValues, partKinds } from '@/services/parts/schemas';

/** The silhouette of a part's family, small, without a name of its own: the part's name stands beside it. */
export function PartPicture({ values, width = 52 }: { values: PartValues; width?: number }) {
  const family =
    values.kind === 'earphone' && values.earphoneKind !== 'ceramic' ? 'headset' : partKinds[values.kind].silhouette;
  return <SvgDrawing drawing={partDrawing(family)} width={width} />;
}

export function KindPicture({ kind, width = 52 }: { kind: PartValues['kind']; width?: number }) {
  return <SvgDrawing drawing={partDrawing(partKinds[kind].silhouette)} width={width} />;
}
