import localFont from 'next/font/local';

// Every face is served from here. Besley and Atkinson are fetched first, since the first screen is set in them.
const besley = localFont({
  src: '../app/fonts/besley-latin-wght-normal.woff2',
  weight: '400 900',
  variable: '--face-besley',
  display: 'swap',
  fallback: ['Georgia', 'serif'],
  adjustFontFallback: 'Times New Roman',
});

const signature = localFont({
  src: '../app/fonts/besley-latin-wght-italic.woff2',
  weight: '400 900',
  style: 'italic',
  variable: '--face-signature',
  display: 'swap',
  preload: false,
  fallback: ['Georgia', 'serif'],
  adjustFontFallback: 'Times New Roman',
});

const atkinson = localFont({
  src: '../app/fonts/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--face-atkinson',
  display: 'swap',
  fallback: ['system-ui', 'sans-serif'],
  adjustFontFallback: 'Arial',
});

const martian = localFont({
  src: '../app/fonts/martian-mono-latin-wdth-normal.woff2',
  weight: '100 800',
  declarations: [{ prop: 'font-stretch', value: '75% 112.5%' }],
  variable: '--face-martian',
  display: 'swap',
  preload: false,
  fallback: ['ui-monospace', 'monospace'],
  adjustFontFallback: false,
});

// Ω, μ and π only. No fallback face: it would stand first in every stack and take all letters.
const greek = localFont({
  src: '../app/fonts/jetbrains-mono-greek-wght-normal.woff2',
  weight: '100 800',
  declarations: [{ prop: 'unicode-range', value: 'U+03A9, U+03BC, U+03C0' }],
  variable: '--face-greek',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
});

/** Class names for `<html>`; they define the `--face-...` variables that app/globals.css stacks. */
export const faces = [besley, signature, atkinson, martian, greek].map((face) => face.variable).join(' ');
