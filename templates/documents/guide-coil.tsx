import { Text, View } from '@react-pdf/renderer';
import { PdfDrawing } from '../drawings/as-pdf';
import { circuitDrawing, circuitSentence } from '../drawings/circuit-drawing';
import { windingDrawing } from '../drawings/winding-drawing';
import type { GuideProps } from './guide-props';
import { Sheet, black, give, hair, measure, type } from './sheet';

/** The winding table: whoever follows it with a rule and a meter need not trust any drawing's scale. */
export function GuideWinding({ view, size }: GuideProps) {
  return (
    <Sheet size={size} plate={view.plate} seller={view.seller} bookmark="The coil">
      <Text style={{ ...type.title, marginTop: 20 * give(size) ** 2 }}>The coil</Text>
      <View style={{ alignItems: 'center' }}>
        <PdfDrawing drawing={windingDrawing(view.winding)} width={measure * give(size)} />
      </View>
      <View style={{ borderTopWidth: 1.9, borderColor: black }}>
        {view.windingRows.map((row) => (
          <View
            key={row.what}
            wrap={false}
            style={{ flexDirection: 'row', borderBottomWidth: 0.75, borderColor: hair, paddingVertical: 3 }}
          >
            <Text style={{ ...type.body, width: 190 }}>{row.what}</Text>
            <Text style={{ ...type.figures, flexGrow: 1, flexBasis: 0 }}>{row.value}</Text>
          </View>
        ))}
      </View>
      <View wrap={false} style={{ marginTop: 12 }}>
        <Text style={type.section}>Where to stop on the way</Text>
        <TapTable rows={view.tapRows} />
        <Text style={{ ...type.small, marginTop: 5 }}>
          The wire is measured from its very start, 15 cm before the first turn. If your wire runs out early or much is
          left, count again.
        </Text>
      </View>
    </Sheet>
  );
}

const tapColumns = ['Point', 'Turns from the start', 'Wire from the start', 'Goes to'] as const;

function TapTable({ rows }: { rows: GuideProps['view']['tapRows'] }) {
  const width = measure / tapColumns.length;
  return (
    <View>
      <View
        style={{ flexDirection: 'row', borderBottomWidth: 1.1, borderColor: black, paddingBottom: 3, marginTop: 6 }}
      >
        {tapColumns.map((column) => (
          <Text key={column} style={{ ...type.small, fontWeight: 600, width }}>
            {column}
          </Text>
        ))}
      </View>
      {rows.map((row) => (
        <View
          key={row.point}
          style={{ flexDirection: 'row', borderBottomWidth: 0.75, borderColor: hair, paddingVertical: 3 }}
        >
          <Text style={{ ...type.strong, width }}>{row.point}</Text>
          <Text style={{ ...type.figures, width }}>{row.turns}</Text>
          <Text style={{ ...type.figures, width }}>{row.wire}</Text>
          <Text style={{ ...type.body, width }}>{row.goesTo}</Text>
        </View>
      ))}
    </View>
  );
}

/** The circuit, drawn from the version, and the same in words for whoever does not read drawings. */
export function GuideCircuit({ view, size }: GuideProps) {
  return (
    <Sheet size={size} plate={view.plate} seller={view.seller} bookmark="The circuit">
      <Text style={{ ...type.title, marginTop: 20 * give(size) ** 2 }}>The circuit</Text>
      <Text style={{ ...type.lead, marginTop: 6, marginBottom: 14 }}>
        Every line is a wire, every dot a joint. The references are those of the parts list.
      </Text>
      <PdfDrawing drawing={circuitDrawing(view.circuit)} width={measure} />
      <View style={{ borderTopWidth: 1.1, borderColor: black, marginTop: 16, paddingTop: 10 }}>
        <Text style={type.section}>In words</Text>
        <Text style={{ ...type.body, marginTop: 5 }}>{circuitSentence(view.circuit)}</Text>
        <Text style={{ ...type.body, marginTop: 8 }}>
          The aerial gathers the waves, coil and capacitor together let one station through, the detector turns its
          waves into the sound they carry, and the earphone makes it heard. All the power comes from the station.
        </Text>
      </View>
    </Sheet>
  );
}
