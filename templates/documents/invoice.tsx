import { Page, Text, View } from '@react-pdf/renderer';
import { formatMoney } from '@/services/money';
import type { PaperSize } from '@/services/documents/schemas';
import type { Invoice } from '@/services/orders/schemas';
import { printable } from '@/services/documents/rules';
import { addressLines } from '@/services/packing/rules';
import { showDate } from '@/services/time';
import { Papers, black, hair, measure, sheetOf, type } from './sheet';

const columns = { quantity: 56, unit: 82, total: 90 };

/** An issued invoice, word for word as it was frozen; paid by card before it was written. */
export function InvoicePaper({ view, size }: { view: Invoice; size: PaperSize }) {
  const sheet = sheetOf(size);
  const name = measure - columns.quantity - columns.unit - columns.total;
  const right = { textAlign: 'right' as const };
  const head = { ...type.small, fontWeight: 600 };
  return (
    <Papers title={`Invoice ${view.number}`} subject={`Order ${view.order.number}`} author={view.seller.name}>
      <Page
        size={sheet.size}
        style={{ ...type.page, paddingTop: sheet.head, paddingBottom: sheet.foot + 18, paddingHorizontal: sheet.side }}
      >
        <View style={{ flexDirection: 'row', borderBottomWidth: 1.9, borderColor: black, paddingBottom: 12 }}>
          <View style={{ flexGrow: 1 }}>
            <Text style={type.title}>Invoice</Text>
            <Text style={{ ...type.figuresBold, fontSize: 18 }}>No. {view.number}</Text>
          </View>
          <View style={{ alignItems: 'flex-end' }}>
            <Text style={{ ...type.plate, fontSize: 14 }}>{view.seller.name}</Text>
            {view.seller.lines.map((line, index) => (
              <Text key={index} style={type.body}>
                {printable(line)}
              </Text>
            ))}
            <Text style={type.small}>{view.seller.country}</Text>
            <Text style={type.small}>VAT number {view.seller.taxId}</Text>
          </View>
        </View>

        <View style={{ flexDirection: 'row', gap: 24, paddingVertical: 16 }}>
          <View style={{ width: 240 }}>
            <Text style={head}>Bill to</Text>
            {[view.buyer.name, ...addressLines(view.buyer.address)].map((line, index) => (
              <Text key={index} style={{ ...type.body, fontSize: 12 }}>
                {printable(line)}
              </Text>
            ))}
            <Text style={{ ...type.small, marginTop: 2 }}>{view.buyer.email}</Text>
          </View>
          <View style={{ gap: 3 }}>
            <Dated label="Date of invoice" value={showDate(view.issuedAt)} />
            <Dated label="Order" value={`${view.order.number}, ${showDate(view.order.placedAt)}`} />
            <Dated label="Paid by card" value={showDate(view.order.paidAt)} />
          </View>
        </View>

        <View fixed style={{ flexDirection: 'row', borderBottomWidth: 1.1, borderColor: black, paddingBottom: 3 }}>
          <Text style={{ ...head, width: name }}>Goods</Text>
          <Text style={{ ...head, ...right, width: columns.quantity }}>Quantity</Text>
          <Text style={{ ...head, ...right, width: columns.unit }}>Each</Text>
          <Text style={{ ...head, ...right, width: columns.total }}>Total</Text>
        </View>
        {view.lines.map((line) => (
          <View
            key={`${line.name} ${line.letter}`}
            wrap={false}
            style={{ flexDirection: 'row', borderBottomWidth: 0.75, borderColor: hair, paddingVertical: 7 }}
          >
            <Text style={{ ...type.strong, width: name }}>
              {printable(line.name)}, receiver kit, version {line.letter}
            </Text>
            <Text style={{ ...type.figures, ...right, width: columns.quantity }}>{line.quantity}</Text>
            <Text style={{ ...type.figures, ...right, width: columns.unit }}>{formatMoney(line.unit)}</Text>
            <Text style={{ ...type.figures, ...right, width: columns.total }}>{formatMoney(line.total)}</Text>
          </View>
        ))}
        <View
          wrap={false}
          style={{ flexDirection: 'row', borderBottomWidth: 1.9, borderColor: black, paddingVertical: 7 }}
        >
          <Text style={{ ...type.body, width: name }}>Delivery: {view.delivery.name}</Text>
          <Text style={{ ...type.figures, ...right, width: columns.quantity }}>1</Text>
          <Text style={{ ...type.figures, ...right, width: columns.unit }}>{formatMoney(view.delivery.price)}</Text>
          <Text style={{ ...type.figures, ...right, width: columns.total }}>{formatMoney(view.delivery.price)}</Text>
        </View>

        <View wrap={false} style={{ alignSelf: 'flex-end', width: 260, marginTop: 10, gap: 4 }}>
          <Sum label="Without tax" value={formatMoney(view.net)} />
          <Sum label={`Tax, ${view.taxBasisPoints / 100} %`} value={formatMoney(view.tax)} />
          <View style={{ borderTopWidth: 1.1, borderColor: black, paddingTop: 4 }}>
            <Sum label="Total, tax included" value={formatMoney(view.total)} bold />
          </View>
          <Sum label={`Paid on ${showDate(view.order.paidAt)}`} value={formatMoney(view.total)} />
          <Sum label="Still due" value={formatMoney({ ...view.total, minor: 0 })} />
        </View>

        <View
          fixed
          style={{
            position: 'absolute',
            left: sheet.side,
            bottom: sheet.foot,
            width: measure,
            flexDirection: 'row',
            justifyContent: 'space-between',
          }}
        >
          <Text style={type.small}>Please quote {view.order.number} when you write to us.</Text>
          <Text style={type.pageNumber} render={({ pageNumber, totalPages }) => `${pageNumber} / ${totalPages}`} />
        </View>
      </Page>
    </Papers>
  );
}

function Dated({ label, value }: { label: string; value: string }) {
  return (
    <View style={{ flexDirection: 'row' }}>
      <Text style={{ ...type.small, width: 92, fontWeight: 600 }}>{label}</Text>
      <Text style={type.body}>{value}</Text>
    </View>
  );
}

function Sum({ label, value, bold = false }: { label: string; value: string; bold?: boolean }) {
  return (
    <View style={{ flexDirection: 'row', justifyContent: 'space-between' }}>
      <Text style={bold ? type.strong : type.body}>{label}</Text>
      <Text style={bold ? type.figuresBold : type.figures}>{value}</Text>
    </View>
  );
}
