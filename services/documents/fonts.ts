import { join } from 'node:path';
import { Font } from '@react-pdf/renderer';

/** Files of templates/fonts, by the family names that the templates use. Never a URL: nothing is fetched to print. */
const faces = [
  { family: 'Besley', file: 'besley-800.ttf', fontWeight: 800, fontStyle: 'normal' },
  { family: 'Besley', file: 'besley-600-italic.ttf', fontWeight: 600, fontStyle: 'italic' },
  { family: 'Atkinson', file: 'atkinson-hyperlegible-next-400.ttf', fontWeight: 400, fontStyle: 'normal' },
  { family: 'Atkinson', file: 'atkinson-hyperlegible-next-600.ttf', fontWeight: 600, fontStyle: 'normal' },
  { family: 'Atkinson', file: 'atkinson-hyperlegible-next-700.ttf', fontWeight: 700, fontStyle: 'normal' },
  { family: 'AtkinsonExt', file: 'atkinson-hyperlegible-next-ext-400.ttf', fontWeight: 400, fontStyle: 'normal' },
  { family: 'AtkinsonExt', file: 'atkinson-hyperlegible-next-ext-600.ttf', fontWeight: 600, fontStyle: 'normal' },
  { family: 'AtkinsonExt', file: 'atkinson-hyperlegible-next-ext-700.ttf', fontWeight: 700, fontStyle: 'normal' },
  { family: 'Martian', file: 'martian-mono-75-500.ttf', fontWeight: 500, fontStyle: 'normal' },
  { family: 'Martian', file: 'martian-mono-75-600.ttf', fontWeight: 600, fontStyle: 'normal' },
  { family: 'Greek', file: 'jetbrains-mono-greek-500.ttf', fontWeight: 500, fontStyle: 'normal' },
] as const;

let loading: Promise<void> | undefined;

/** Registers and reads the faces, once a process. */
export function loadFonts(): Promise<void> {
  loading ??= load();
  return loading;
}

async function load(): Promise<void> {
  const folder = join(process.cwd(), 'templates', 'fonts');
  for (const { family, file, fontWeight, fontStyle } of faces) {
    Font.register({ family, src: join(folder, file), fontWeight, fontStyle });
    const face = { fontFamily: family, fontWeight, fontStyle };
    await Font.load(face);
    nameGlyphs(Font.getFont(face)?.data);
  }
  // Words are broken between them only: a part's code or a serial must stay readable and searchable.
  Font.registerHyphenationCallback((word) => [word]);
}

/** What is used of a font as fontkit reads it. */
interface Glyphs {
  characterSet: number[];
  glyphForCodePoint(codePoint: number): unknown;
}

/**
 * fontkit 2.0.4 keeps each glyph as it was first asked for. A point that first comes as a piece of a colon has no
 * character then, and from that document on every "1.9" prints as ".9". So all glyphs are asked for by character first.
 */
function nameGlyphs(font: unknown): void {
  if (!isGlyphs(font)) throw new Error('A face of templates/fonts could not be read.');
  for (const codePoint of font.characterSet) font.glyphForCodePoint(codePoint);
}

const isGlyphs = (font: unknown): font is Glyphs =>
  typeof font === 'object' && font !== null && 'characterSet' in font && 'glyphForCodePoint' in font;
