import { Document, Page, StyleSheet, Text, View } from '@react-pdf/renderer';
import type { ReactNode } from 'react';
import type { PaperSize, PrintPlate } from '@/services/documents/schemas';

/** Points to a millimetre. */
export const mm = 72 / 25.4;

/** A content of 182 by 251 mm fits both without scaling, so a guide printed on the other paper stays true. */
const sheets: Record<PaperSize, { size: [number, number]; side: number; head: number; foot: number }> = {
  a4: { size: [595.28, 841.89], side: 14 * mm, head: 14 * mm, foot: 14 * mm },
  letter: { size: [612, 792], side: 16.95 * mm, head: 12 * mm, foot: 12 * mm },
};

export const sheetOf = (size: PaperSize) => sheets[size];

/** Letter is 18 mm shorter: drawings and gaps give way there, never the size of the words. */
export const give = (size: PaperSize) => (size === 'letter' ? 0.8 : 1);

/** Width of what is printed, points. */
export const measure = 182 * mm;

export const black = '#111111';
export const grey = '#333333';
export const hair = '#999999';

/** The extended face fills in the letters of names such as Łódź, the Greek one Ω, μ and π. */
const text = ['Atkinson', 'AtkinsonExt', 'Greek'];
const figures = ['Martian', 'AtkinsonExt', 'Greek'];
const display = ['Besley', 'Atkinson', 'AtkinsonExt', 'Greek'];

export const type = StyleSheet.create({
  body: { fontFamily: text, fontSize: 11, lineHeight: 1.4, color: black },
  small: { fontFamily: text, fontSize: 10, lineHeight: 1.35, color: grey },
  strong: { fontFamily: text, fontSize: 11, lineHeight: 1.4, fontWeight: 700, color: black },
  lead: { fontFamily: text, fontSize: 12.5, lineHeight: 1.45, color: black },
  figures: { fontFamily: figures, fontSize: 11, lineHeight: 1.35, fontWeight: 500, color: black },
  figuresBold: { fontFamily: figures, fontSize: 12, lineHeight: 1.3, fontWeight: 600, color: black },
  /** Besley hangs low in its line, so what follows keeps a distance. */
  title: { fontFamily: display, fontSize: 30, lineHeight: 1.3, fontWeight: 800, color: black, marginBottom: 5 },
  section: { fontFamily: display, fontSize: 17, lineHeight: 1.3, fontWeight: 800, color: black, marginBottom: 3 },
  plate: { fontFamily: display, fontSize: 13, lineHeight: 1.3, fontWeight: 800, color: black },
  /** Of whole pages, and of page numbers: react-pdf 4.9.0 applies a line height twice to text made by `render`. */
  page: { fontFamily: text, fontSize: 11, color: black },
  pageNumber: { fontFamily: figures, fontSize: 10.5, fontWeight: 600, color: black },
  signature: { fontFamily: 'Besley', fontSize: 14, fontWeight: 600, fontStyle: 'italic', color: black },
});

const look = StyleSheet.create({
  head: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: 10,
    borderBottomWidth: 1.9,
    borderColor: black,
    paddingBottom: 8,
  },
  foot: {
    position: 'absolute',
    flexDirection: 'row',
    justifyContent: 'space-between',
    borderTopWidth: 0.75,
    borderColor: hair,
    paddingTop: 5,
  },
});

/** A document with what readers and machines ask first: title, language, author. */
export function Papers({
  title,
  subject,
  author,
  children,
}: {
  title: string;
  subject: string;
  author: string;
  children: ReactNode;
}) {
  return (
    <Document title={title} subject={subject} author={author} creator={author} producer={author} language="en-GB">
      {children}
    </Document>
  );
}

export interface SheetProps {
  size: PaperSize;
  plate: PrintPlate;
  /** Right of the name in the head: the step strip, the order. */
  aside?: ReactNode;
  seller: string;
  /** Anchor and entry in the outline of the document. */
  bookmark?: string;
  children: ReactNode;
}

/** One kind of sheet with plate and name on top and the version it is made for at the foot; it runs on as long as it must. */
export function Sheet({ size, plate, aside, seller, bookmark, children }: SheetProps) {
  const sheet = sheets[size];
  const name = `${plate.number} ${plate.letter}`;
  return (
    <Page
      size={sheet.size}
      {...(bookmark !== undefined && { bookmark })}
      style={{
        ...type.page,
        paddingTop: sheet.head,
        paddingBottom: sheet.foot + 26,
        paddingHorizontal: sheet.side,
      }}
    >
      <View fixed style={look.head}>
        <Plate plate={plate} />
        <Text style={{ ...type.strong, fontSize: 13 }}>{plate.name}</Text>
        <View style={{ flexGrow: 1 }} />
        {aside}
      </View>
      {children}
      <View fixed style={{ ...look.foot, left: sheet.side, width: measure, bottom: sheet.foot }}>
        <Text style={type.small}>Made for version {name} only. Match it to the plate on the lid.</Text>
        <View style={{ flexDirection: 'row', gap: 14 }}>
          <Text style={type.small}>{seller}</Text>
          <Text style={type.pageNumber} render={({ pageNumber, totalPages }) => `${pageNumber} / ${totalPages}`} />
        </View>
      </View>
    </Page>
  );
}

/** The riveted plate in one ink: what people match by eye on screen, lid, slip and guide. */
export function Plate({ plate, size = 13 }: { plate: PrintPlate; size?: number }) {
  return (
    <View style={{ borderWidth: 1.9, borderColor: black, borderRadius: 6, padding: 1.8 }}>
      <View
        style={{
          flexDirection: 'row',
          alignItems: 'center',
          borderWidth: 0.75,
          borderColor: black,
          borderRadius: 4,
          paddingHorizontal: size * 0.75,
          paddingVertical: size * 0.18,
        }}
      >
        <Text style={{ ...type.plate, fontSize: size, marginTop: -size * 0.2 }}>No. {plate.number}</Text>
        <View style={{ width: 0.75, height: size * 0.95, backgroundColor: black, marginHorizontal: size * 0.55 }} />
        <Text style={{ ...type.figuresBold, fontSize: size * 0.9 }}>{plate.letter}</Text>
      </View>
    </View>
  );
}

/** A box to tick by hand: 6 mm. */
export function TickBox() {
  return <View style={{ width: 6 * mm, height: 6 * mm, borderWidth: 1.4, borderColor: black, borderRadius: 3 }} />;
}
