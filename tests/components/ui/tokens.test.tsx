import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync('app/globals.css', 'utf8');

/** The pair of a token in light and dark, as globals.css has it. */
function pair(token: string): { light: string; dark: string } {
  const found = new RegExp(`--${token}: light-dark\\((#[0-9a-f]{6}), (#[0-9a-f]{6})\\)`).exec(css);
  if (!found?.[1] || !found[2]) throw new Error(`No colours for --${token} in globals.css.`);
  return { light: found[1], dark: found[2] };
}

/** Contrast ratio and relative luminance: WCAG 2.2, definitions of terms. */
function contrast(one: string, other: string): number {
  const [high, low] = [luminance(one), luminance(other)].sort((a, b) => b - a) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4)) as [
    number,
    number,
    number,
  ];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

const THEMES = ['light', 'dark'] as const;
const GROUNDS = ['paper', 'sheet'] as const;

describe('contrast of the tokens', () => {
  it('agrees with the two ratios that every implementation knows', () => {
    // 21:1 is the largest by definition; #767676 is the known lightest grey for text on white, 4.54:1 (from memory).
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
    expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
  });

  it.each(['ink', 'ink-2', 'ink-3', 'coral-ink', 'tide', 'kelp', 'amber'])(
    '%s is legible as text: 4.5:1 (WCAG 2.2, 1.4.3)',
    (token) => {
      for (const theme of THEMES)
        for (const ground of GROUNDS)
          expect(
            contrast(pair(token)[theme], pair(ground)[theme]),
            `${theme} on ${ground}`,
          ).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(['edge', 'coral'])('%s is visible as a line: 3:1 (WCAG 2.2, 1.4.11)', (token) => {
    for (const theme of THEMES)
      for (const ground of GROUNDS)
        expect(
          contrast(pair(token)[theme], pair(ground)[theme]),
          `${theme} on ${ground}`,
        ).toBeGreaterThanOrEqual(3);
  });

  it('gives a registered colour the same start as its light value', () => {
    for (const [, token, initial] of css.matchAll(
      /@property --([\w-]+) \{[^}]*initial-value: (#[0-9a-f]{6});/g,
    ))
      expect(pair(token ?? '').light, token).toBe(initial);
  });
});
