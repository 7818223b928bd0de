import { Text, View } from '@react-pdf/renderer';
import type { GuidePart } from '@/services/documents/schemas';
import type { GuideProps } from './guide-props';
import { PartPicture } from './part-picture';
import { Sheet, TickBox, black, give, hair, type } from './sheet';

const columns = { picture: 62, line: 44, count: 56, yours: 44 };

/** The checklist: a picture, the reference, how to recognise it, how many, and a box to tick. */
export function GuideParts({ view, size }: GuideProps) {
  const head = { ...type.small, fontWeight: 600 };
  return (
    <Sheet size={size} plate={view.plate} seller={view.seller} bookmark="What is in the box">
      <Text style={{ ...type.title, marginTop: 20 * give(size) ** 2 }}>What is in the box</Text>
      <Text style={{ ...type.lead, marginTop: 4, marginBottom: 2 }}>
        {view.pieces} pieces and this guide. Tick each one before you start; the steps and the circuit call it by its
        line.
      </Text>
      <View
        fixed
        style={{ flexDirection: 'row', borderBottomWidth: 1.1, borderColor: black, paddingTop: 6, paddingBottom: 3 }}
      >
        <Text style={{ ...head, marginLeft: columns.picture, width: columns.line }}>Line</Text>
        <Text style={{ ...head, flexGrow: 1 }}>Part, and how to recognise it</Text>
        <Text style={{ ...head, width: columns.count, textAlign: 'center' }}>Pieces</Text>
        <Text style={{ ...head, width: columns.yours, textAlign: 'center' }}>Yours</Text>
      </View>
      {view.parts.map((part) => (
        <PartRow key={part.reference} part={part} height={rowHeight(view.parts.length) * give(size)} />
      ))}
      <View
        wrap={false}
        style={{ borderTopWidth: 1.9, borderColor: black, marginTop: -0.75, paddingTop: 12 * give(size) }}
      >
        <Text style={type.section}>Tools</Text>
        {view.tools.map((tool) => (
          <Text key={tool} style={{ ...type.body, marginTop: 3 }}>
            {tool}
          </Text>
        ))}
      </View>
    </Sheet>
  );
}

/** Up to sixteen parts and the tools stand on one sheet. */
const rowHeight = (parts: number) => (parts > 12 ? 32 : 37);

function PartRow({ part, height }: { part: GuidePart; height: number }) {
  const recognise = [part.marking, part.note].filter((text) => text !== '').join('; ');
  return (
    <View
      wrap={false}
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        minHeight: height,
        borderBottomWidth: 0.75,
        borderColor: hair,
      }}
    >
      <View style={{ width: columns.picture }}>
        <PartPicture family={part.family} width={height * 1.13} />
      </View>
      <Text style={{ ...type.figuresBold, width: columns.line }}>{part.reference}</Text>
      <View style={{ flexGrow: 1, flexBasis: 0, paddingRight: 8 }}>
        <Text style={type.strong}>{part.name}</Text>
        {recognise !== '' && <Text style={type.small}>{recognise}</Text>}
      </View>
      <Text style={{ ...type.figuresBold, width: columns.count, textAlign: 'center' }}>{part.amount}</Text>
      <View style={{ width: columns.yours, alignItems: 'center' }}>
        <TickBox />
      </View>
    </View>
  );
}
