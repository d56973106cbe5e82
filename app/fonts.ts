import localFont from 'next/font/local';

/**
 * The superscripts ¹ ² ³ are left out of every face: the files lack the rest of the row (⁰ ⁴ … ⁻),
 * and "cm⁻³" set from two fonts looks broken. One fallback draws the whole row instead.
 * The loader reads these calls without running them, so every value is written out.
 */
const sansLatin = localFont({
  src: '../node_modules/@fontsource-variable/instrument-sans/files/instrument-sans-latin-wght-normal.woff2',
  weight: '400 700',
  display: 'swap',
  variable: '--font-sans-latin',
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0000-00B1,U+00B4,U+00B6-00B8,U+00BA-00FF,U+0131,U+0152-0153,U+02BB-02BC,U+02C6,U+02DA,U+02DC,U+2000-206F,U+20AC,U+2122,U+2212,U+2215',
    },
  ],
});

const sansLatinExt = localFont({
  src: '../node_modules/@fontsource-variable/instrument-sans/files/instrument-sans-latin-ext-wght-normal.woff2',
  weight: '400 700',
  display: 'swap',
  preload: false,
  variable: '--font-sans-latin-ext',
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+1E00-1E9F,U+1EF2-1EFF' },
  ],
});

const serifLatin = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-latin-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  variable: '--font-serif-latin',
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0000-00B1,U+00B4-00B8,U+00BA-00FF,U+0131,U+0152-0153,U+02BB-02BC,U+02C6,U+02DA,U+02DC,U+2000-206F,U+20AC,U+2122,U+2212,U+2215',
    },
  ],
});

const serifLatinExt = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-latin-ext-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  preload: false,
  variable: '--font-serif-latin-ext',
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+1E00-1E9F,U+1EF2-1EFF' },
  ],
});

/** Greek letters of formulas (χ, σ, Λ): neither the grotesque nor the mono has them, so all three families borrow these. */
const greek = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-greek-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  variable: '--font-greek',
  adjustFontFallback: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0370-03FF' }],
});

const monoLatin = localFont({
  src: '../node_modules/@fontsource-variable/spline-sans-mono/files/spline-sans-mono-latin-wght-normal.woff2',
  weight: '300 700',
  display: 'swap',
  variable: '--font-mono-latin',
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0000-00B1,U+00B4-00B8,U+00BA-00FF,U+0131,U+0152-0153,U+02BB-02BC,U+02C6,U+02DA,U+02DC,U+2000-206F,U+20AC,U+2122,U+2212,U+2215',
    },
  ],
});

const monoLatinExt = localFont({
  src: '../node_modules/@fontsource-variable/spline-sans-mono/files/spline-sans-mono-latin-ext-wght-normal.woff2',
  weight: '300 700',
  display: 'swap',
  preload: false,
  variable: '--font-mono-latin-ext',
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+1E00-1E9F,U+1EF2-1EFF' },
  ],
});

/** Class names that define the font variables globals.css builds its stacks from. */
export const fontVariables = [
  sansLatin,
  sansLatinExt,
  serifLatin,
  serifLatinExt,
  greek,
  monoLatin,
  monoLatinExt,
]
  .map((font) => font.variable)
  .join(' ');
