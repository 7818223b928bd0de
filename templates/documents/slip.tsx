import { Page, Text, View } from '@react-pdf/renderer';
import type { PaperSize, SlipView } from '@/services/documents/schemas';
import { PartPicture } from './part-picture';
import { QrCode } from './qr';
import { Rail } from './rail';
import { Papers, Plate, TickBox, black, give, grey, hair, measure, mm, sheetOf, type } from './sheet';

const columns = { picture: 46, line: 62, bin: 58, pieces: 46, scanned: 54, yours: 40 };

/** The packing slip: what the buyer counts the box against. No price stands on it. */
export function SlipPaper({ view, size }: { view: SlipView; size: PaperSize }) {
  const sheet = sheetOf(size);
  return (
    <Papers
      title={`Packing slip, ${view.orderNumber}, box ${view.position} of ${view.of}`}
      subject={`Box ${view.serial}, version ${view.plate.number} ${view.plate.letter}`}
      author={view.seller}
    >
      <Page
        size={sheet.size}
        style={{ ...type.page, paddingTop: sheet.head, paddingBottom: sheet.foot + 18, paddingHorizontal: sheet.side }}
      >
        <Head view={view} />
        <Facts view={view} />
        <Contents view={view} height={rowHeight(view.lines.length, size)} />
        <View wrap={false} style={{ marginTop: 10 }}>
          <Text style={type.strong}>What this version tunes at worst case</Text>
          <Rail reach={view.reach} width={measure * give(size)} />
        </View>
        <Foot view={view} />
        <PageFoot view={view} side={sheet.side} foot={sheet.foot} />
      </Page>
    </Papers>
  );
}

function Head({ view }: { view: SlipView }) {
  return (
    <View style={{ flexDirection: 'row', borderBottomWidth: 1.9, borderColor: black, paddingBottom: 8 }}>
      <View style={{ flexGrow: 1 }}>
        <Text style={{ ...type.plate, fontSize: 12.5 }}>{view.seller}</Text>
        <Text style={type.title}>Packing slip</Text>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 10, marginTop: 2 }}>
          <Plate plate={view.plate} />
          <Text style={{ ...type.strong, fontSize: 13.5 }}>{view.plate.name}</Text>
        </View>
      </View>
      <View style={{ alignItems: 'flex-end', marginRight: 8 }}>
        <Text style={{ ...type.figuresBold, fontSize: 26 }}>{view.orderNumber}</Text>
        <Text style={{ ...type.strong, fontSize: 13.5 }}>
          Box {view.position} of {view.of}
        </Text>
        <Text style={{ ...type.figures, fontSize: 10.5, marginTop: 3 }}>{view.serial}</Text>
        <Text style={{ ...type.figures, fontSize: 10.5 }}>content {view.hash}</Text>
      </View>
      <QrCode text={view.serial} width={84} />
    </View>
  );
}

function Facts({ view }: { view: SlipView }) {
  return (
    <View style={{ flexDirection: 'row', gap: 18, paddingTop: 8, paddingBottom: 6 }}>
      <Fact label="Send to" lines={view.sendTo} width={200} />
      <View style={{ flexGrow: 1, flexBasis: 0, gap: 4 }}>
        <View style={{ flexDirection: 'row', gap: 18 }}>
          <Fact
            label="Packed"
            lines={view.packed ? [view.packed.on, `by ${view.packed.by}`] : ['not packed yet']}
            width={150}
          />
          <Fact
            label="Weight"
            lines={[
              view.weight.weighed === null ? 'not weighed yet' : `${view.weight.weighed} kg on the scale`,
              `${view.weight.expected} kg expected`,
            ]}
            width={130}
          />
        </View>
        {view.giftNote !== '' && <Fact label="With this gift" lines={[view.giftNote]} width={298} />}
      </View>
    </View>
  );
}

function Fact({ label, lines, width }: { label: string; lines: readonly string[]; width: number }) {
  return (
    <View style={{ width }}>
      <Text style={{ ...type.small, fontWeight: 600 }}>{label}</Text>
      {lines.map((line, index) => (
        <Text key={index} style={{ ...type.body, fontSize: 11.5, lineHeight: 1.3 }}>
          {line}
        </Text>
      ))}
    </View>
  );
}

/** Sixteen lines stand on one sheet; a longer list runs on with its head repeated. */
const rowHeight = (lines: number, size: PaperSize) =>
  (lines > 13 ? 21.5 : lines > 10 ? 24.5 : 30) - (size === 'letter' ? (lines > 13 ? 2 : 3) : 0);

function Contents({ view, height }: { view: SlipView; height: number }) {
  const name = measure - Object.values(columns).reduce((sum, width) => sum + width, 0);
  const head = { ...type.small, fontWeight: 600 };
  const center = { textAlign: 'center' as const };
  return (
    <View>
      <View fixed style={{ flexDirection: 'row', borderBottomWidth: 1.1, borderColor: black, paddingBottom: 3 }}>
        <Text style={{ ...head, marginLeft: columns.picture, width: columns.line }}>Line</Text>
        <Text style={{ ...head, width: name }}>Part</Text>
        <Text style={{ ...head, ...center, width: columns.bin }}>Bin</Text>
        <Text style={{ ...head, ...center, width: columns.pieces }}>Pieces</Text>
        <Text style={{ ...head, ...center, width: columns.scanned }}>Scanned</Text>
        <Text style={{ ...head, ...center, width: columns.yours }}>Yours</Text>
      </View>
      {view.lines.map((line) => (
        <View
          key={line.reference}
          wrap={false}
          style={{ flexDirection: 'row', alignItems: 'center', height, borderBottomWidth: 0.75, borderColor: hair }}
        >
          <View style={{ width: columns.picture }}>
            <PartPicture family={line.family} width={27} scheme="ink" />
          </View>
          <Text style={{ ...type.figures, width: columns.line }}>{line.reference}</Text>
          <Text style={{ ...type.strong, width: name, paddingRight: 6 }}>{line.name}</Text>
          <Text style={{ ...type.figures, ...center, width: columns.bin }}>{line.bin}</Text>
          <Text style={{ ...type.figuresBold, ...center, width: columns.pieces }}>{line.pieces}</Text>
          <Text style={{ ...type.figures, ...center, width: columns.scanned }}>{line.scanned}</Text>
          <View style={{ width: columns.yours, alignItems: 'center' }}>
            <TickBox />
          </View>
        </View>
      ))}
      <View
        wrap={false}
        style={{ flexDirection: 'row', alignItems: 'center', height: 25, borderBottomWidth: 1.9, borderColor: black }}
      >
        <Text style={{ ...type.strong, marginLeft: columns.picture + columns.line, width: name }}>All pieces</Text>
        <Text style={{ ...type.figuresBold, ...center, marginLeft: columns.bin, width: columns.pieces }}>
          {view.pieces}
        </Text>
      </View>
    </View>
  );
}

function Foot({ view }: { view: SlipView }) {
  return (
    <View wrap={false} style={{ marginTop: 6 }}>
      <View style={{ flexDirection: 'row', gap: 22, alignItems: 'flex-end' }}>
        <Text style={{ ...type.body, flexGrow: 1, flexBasis: 0 }}>{view.missing}</Text>
        {view.signOff && (
          <View style={{ width: 64 * mm }}>
            <Text style={{ ...type.signature, borderBottomWidth: 1.1, borderColor: black, paddingBottom: 4 }}>
              {view.signOff.by}
            </Text>
            <Text style={{ ...type.small, color: grey, marginTop: 3 }}>
              Version {view.plate.number} {view.plate.letter} released {view.signOff.on}
            </Text>
          </View>
        )}
      </View>
    </View>
  );
}

function PageFoot({ view, side, foot }: { view: SlipView; side: number; foot: number }) {
  return (
    <View
      fixed
      style={{
        position: 'absolute',
        left: side,
        bottom: foot,
        width: measure,
        flexDirection: 'row',
        justifyContent: 'space-between',
      }}
    >
      <Text style={type.small}>
        Made for version {view.plate.number} {view.plate.letter} only.
      </Text>
      <Text style={type.pageNumber} render={({ pageNumber, totalPages }) => `${pageNumber} / ${totalPages}`} />
    </View>
  );
}
