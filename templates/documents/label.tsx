import { Page, Text, View } from '@react-pdf/renderer';
import type { LabelView } from '@/services/documents/schemas';
import { QrCode } from './qr';
import { Papers, Plate, black, mm, type } from './sheet';

/** The box label, 62 by 100 mm: the plate, and the serial as symbol and in letters. */
export function LabelPaper({ view }: { view: LabelView }) {
  return (
    <Papers title={`Box label ${view.serial}`} subject={`Order ${view.orderNumber}`} author={view.seller}>
      <Page size={[62 * mm, 100 * mm]} style={{ ...type.page, padding: 4 * mm, alignItems: 'center' }}>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
          <Plate plate={view.plate} size={17} />
        </View>
        <Text style={{ ...type.section, marginTop: 5 }}>{view.plate.name}</Text>
        <QrCode text={view.serial} width={37 * mm} />
        <Text style={{ ...type.figuresBold, fontSize: 14 }}>{view.serial}</Text>
        <Text style={{ ...type.figures, fontSize: 10 }}>content {view.hash}</Text>
        <View
          style={{
            flexDirection: 'row',
            justifyContent: 'space-between',
            width: 54 * mm,
            marginTop: 5,
            paddingTop: 5,
            borderTopWidth: 1.1,
            borderColor: black,
          }}
        >
          <Text style={{ ...type.figuresBold, fontSize: 13 }}>{view.orderNumber}</Text>
          <Text style={{ ...type.strong, fontSize: 11 }}>
            Box {view.position} of {view.of}
          </Text>
        </View>
        <View style={{ flexDirection: 'row', justifyContent: 'space-between', width: 54 * mm }}>
          <Text style={type.small}>From {view.ageFrom} years</Text>
          <Text style={type.small}>{view.mass}</Text>
        </View>
      </Page>
    </Papers>
  );
}
