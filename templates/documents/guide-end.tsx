import { Text, View } from '@react-pdf/renderer';
import type { GuideProps } from './guide-props';
import { Rail } from './rail';
import { Sheet, black, give, hair, measure, type } from './sheet';

const columns = [0.26, 0.2, 0.26, 0.28].map((share) => share * measure);

/** What to expect on the dial, what to do when it stays silent, and whom to write to. */
export function GuideEnd({ view, size }: GuideProps) {
  return (
    <Sheet size={size} plate={view.plate} seller={view.seller} bookmark="What you should tune">
      <Text style={{ ...type.title, marginTop: 14 * give(size) ** 2 }}>What you should tune</Text>
      <TuneTable view={view} />
      <View style={{ alignItems: 'center' }}>
        <Rail reach={view.reach} width={measure * give(size)} />
      </View>
      <View style={{ borderTopWidth: 1.9, borderColor: black, marginTop: 12 * give(size), paddingTop: 9 * give(size) }}>
        <Text style={type.section}>If it stays silent</Text>
        <Text style={{ ...type.body, marginBottom: 5 }}>From the top; the first one that fits is most often it.</Text>
        {view.faults.map((fault) => (
          <View
            key={fault.sign}
            wrap={false}
            style={{
              flexDirection: 'row',
              borderTopWidth: 0.75,
              borderColor: hair,
              paddingVertical: 4 * give(size) ** 2,
            }}
          >
            <Text style={{ ...type.strong, width: 150, paddingRight: 12 }}>{fault.sign}</Text>
            <Text style={{ ...type.body, flexGrow: 1, flexBasis: 0 }}>{fault.cure}</Text>
          </View>
        ))}
      </View>
      <View wrap={false} style={{ borderWidth: 1.9, borderColor: black, borderRadius: 6, padding: 9, marginTop: 8 }}>
        <Text style={{ ...type.strong, fontSize: 13 }}>A part is missing or broken</Text>
        <Text style={type.body}>{view.missing}</Text>
      </View>
    </Sheet>
  );
}

function TuneTable({ view }: { view: GuideProps['view'] }) {
  const head = ['', 'Nominal', 'Every box, at worst case', ''];
  return (
    <View style={{ marginTop: 8, marginBottom: 10 }}>
      <View style={{ flexDirection: 'row', borderBottomWidth: 1.1, borderColor: black, paddingBottom: 3 }}>
        {head.map((text, index) => (
          <Text key={index} style={{ ...type.small, fontWeight: 600, width: columns[index] ?? 0 }}>
            {text}
          </Text>
        ))}
      </View>
      {view.tune.map((row) => (
        <View
          key={row.end}
          style={{ flexDirection: 'row', borderBottomWidth: 0.75, borderColor: hair, paddingVertical: 5 }}
        >
          <Text style={{ ...type.strong, width: columns[0] ?? 0 }}>{row.end}</Text>
          <Text style={{ ...type.figures, width: columns[1] ?? 0 }}>{row.nominal}</Text>
          <Text style={{ ...type.figures, width: columns[2] ?? 0 }}>{row.worst}</Text>
          <Text style={{ ...type.small, width: columns[3] ?? 0 }}>{row.hint}</Text>
        </View>
      ))}
    </View>
  );
}
