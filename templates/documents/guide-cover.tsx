import { Text, View } from '@react-pdf/renderer';
import { stageDrawing } from '../drawings/kit-drawing';
import { PdfDrawing } from '../drawings/as-pdf';
import type { GuideProps } from './guide-props';
import { QrCode } from './qr';
import { Rail } from './rail';
import { Sheet, black, give, hair, type } from './sheet';

export function GuideCover({ view, size }: GuideProps) {
  const { plate } = view;
  return (
    <Sheet
      size={size}
      plate={plate}
      seller={view.seller}
      bookmark="Cover"
      aside={<Text style={{ ...type.figures, fontSize: 10.5 }}>box {view.serial}</Text>}
    >
      <View style={{ flexDirection: 'row', marginTop: 22 * give(size), gap: 20, alignItems: 'flex-start' }}>
        <View style={{ flexGrow: 1, flexBasis: 0 }}>
          <Text style={{ ...type.strong, fontSize: 13 }}>Build guide</Text>
          <Text style={{ ...type.title, fontSize: 44, marginBottom: 8 }}>{plate.name}</Text>
          <Text style={{ ...type.lead, marginTop: 10 }}>{view.summary}</Text>
        </View>
        <View style={{ alignItems: 'center' }}>
          <QrCode text={view.code} width={128} />
          <Text style={{ ...type.figures, fontSize: 10 }}>{view.code}</Text>
          <Text style={type.small}>scanned when it was packed</Text>
        </View>
      </View>
      <View style={{ alignItems: 'center', marginTop: 14 * give(size), marginBottom: 8 }}>
        <PdfDrawing drawing={stageDrawing(lookOf(view), { callouts: false })} width={340 * give(size)} />
      </View>
      <View style={{ borderTopWidth: 1.9, borderColor: black, marginTop: 'auto' }}>
        <Row label="Version" value={`${plate.number} ${plate.letter}, content ${view.hash}`} figures />
        <Row label="Box" value={view.serial} figures />
        <Row label="For" value={`${view.audience}, from ${view.ageFrom} years`} />
        {view.released && <Row label="Checked" value={`by ${view.released.by}, released ${view.released.on}`} />}
        {view.withdrawn !== '' && <Row label="Take note" value={view.withdrawn} />}
      </View>
      <View style={{ marginTop: 12 }} wrap={false}>
        <Text style={type.strong}>What it tunes</Text>
        <Rail reach={view.reach} />
        <Text style={{ ...type.small, marginTop: 2 }}>
          Brackets: the band it is made for. Solid: what every box reaches at worst case. Outline: a box of nominal
          parts. Tuning says nothing of strength. What you hear depends on your aerial, your earth and the hour.
        </Text>
      </View>
    </Sheet>
  );
}

function lookOf(view: GuideProps['view']) {
  const families = new Set(view.parts.map((part) => part.family));
  return {
    coil: { form: 'tube' as const, turns: view.winding.turns, taps: view.winding.taps.map((tap) => tap.turn) },
    tuning: view.circuit.tuning.kind === 'foil' ? ('foil-plates' as const) : ('vanes' as const),
    earphone: families.has('headset') ? ('headset' as const) : ('earpiece' as const),
  };
}

function Row({ label, value, figures = false }: { label: string; value: string; figures?: boolean }) {
  return (
    <View style={{ flexDirection: 'row', borderBottomWidth: 0.75, borderColor: hair, paddingVertical: 3.5 }}>
      <Text style={{ ...type.small, fontWeight: 600, width: 92 }}>{label}</Text>
      <Text style={{ ...(figures ? type.figures : type.body), flexGrow: 1, flexBasis: 0 }}>{value}</Text>
    </View>
  );
}

/** Cautions come before anything is opened. */
export function GuideCautions({ view, size }: GuideProps) {
  return (
    <Sheet size={size} plate={view.plate} seller={view.seller} bookmark="Cautions first">
      <Text style={{ ...type.title, marginTop: 20 * give(size) ** 3 }}>Cautions first</Text>
      <Text style={{ ...type.lead, marginTop: 6, marginBottom: 10 }}>{view.cautionNote}</Text>
      {view.cautions.map((caution) => (
        <View
          key={caution.title}
          wrap={false}
          style={{
            flexDirection: 'row',
            borderTopWidth: 0.75,
            borderColor: hair,
            paddingVertical: 7 * give(size) ** 3,
          }}
        >
          <Text style={{ ...type.strong, width: 124, paddingRight: 10 }}>{caution.title}</Text>
          <Text style={{ ...type.body, flexGrow: 1, flexBasis: 0 }}>{caution.text}</Text>
        </View>
      ))}
      <View style={{ borderTopWidth: 1.9, borderColor: black, marginTop: 6, paddingTop: 12 * give(size) }} wrap={false}>
        <Text style={type.section}>Before you begin</Text>
        <Text style={{ ...type.body, marginTop: 5 }}>{view.intro}</Text>
        {view.needs.map((need) => (
          <Text key={need} style={{ ...type.body, marginTop: 4 }}>
            {need}
          </Text>
        ))}
      </View>
    </Sheet>
  );
}
