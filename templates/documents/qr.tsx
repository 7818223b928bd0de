import { Path, Svg } from '@react-pdf/renderer';
import QRCode from 'qrcode';

/** A QR symbol as one path of squares, with the four modules of quiet zone it needs; `width` in points of paper. */
export function QrCode({ text, width }: { text: string; width: number }) {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: 'M' });
  const quiet = 4;
  const side = modules.size + 2 * quiet;
  let d = '';
  for (let row = 0; row < modules.size; row++) {
    for (let column = 0; column < modules.size; column++) {
      if (modules.get(row, column)) d += `M${column + quiet} ${row + quiet}h1v1h-1z`;
    }
  }
  return (
    <Svg width={width} height={width} viewBox={`0 0 ${side} ${side}`}>
      <Path d={d} fill="#111111" />
    </Svg>
  );
}
