import { describe, expect, it } from 'vitest';
import {
  decimalsFor,
  formatConcentration,
  formatProbability,
  formatWithInterval,
} from '@/lib/format';

// Rounding rule: Particle Data Group, Review of Particle Physics, introduction, section 5.3:
// 0.827 ± 0.119 → 0.83 ± 0.12 and 0.827 ± 0.367 → 0.8 ± 0.4 are its own examples.
describe('results with what is known of them', () => {
  it.each([
    [0.827, 0.119, '0.83', '0.12'],
    [0.827, 0.367, '0.8', '0.4'],
  ])('%d ± %d', (value, sigma, expectedValue, expectedSigma) => {
    const parts = formatWithInterval(value, null, sigma);
    expect([parts.value, parts.plus, parts.minus]).toEqual([
      expectedValue,
      expectedSigma,
      expectedSigma,
    ]);
  });

  // The limits of the rule's three clauses: 354/355 and 949/950 of the three leading digits.
  it.each([
    [0.354, 2],
    [0.355, 1],
    [0.949, 1],
    [0.95, 1],
    [1000, -2],
    [0.001, 4],
    [1e-15, 16],
  ])('an uncertainty of %d allows %d decimals', (uncertainty, decimals) => {
    expect(decimalsFor(uncertainty)).toBe(decimals);
  });

  it('writes two different sides', () => {
    const parts = formatWithInterval(78.4123, [76.52, 80.49], 2, 'nm');
    expect(parts).toMatchObject({
      value: '78.4',
      plus: '2.1',
      minus: '1.9',
      unit: 'nm',
      exponent: null,
    });
    expect(parts.sentence).toBe('78.4 +2.1 −1.9 nm');
    expect(parts.full).toBe('78.4123 nm');
  });

  it('writes equal sides in units of the last digit', () => {
    expect(formatWithInterval(0.742, [0.738, 0.746], 0.004).sentence).toBe('0.742(4)');
  });

  it('lets the finer side set the digits, but not one that is a bound', () => {
    expect(formatWithInterval(10, [9.88, 10.37], null, 'nm').sentence).toBe('10.00 +0.37 −0.12 nm');
    expect(formatWithInterval(0, [0, 3.2], null, 'nm').sentence).toBe('0.0 +3.2 −0.0 nm');
  });

  it('says a bound in words where one side is open', () => {
    const words = { more: 'deeper than', less: 'shallower than' };
    const deeper = formatWithInterval(131, [118, null], null, 'nm', {
      interval95: [112.3, null],
      words,
    });
    expect(deeper.sentence).toBe('deeper than 112 nm (95 %)');
    expect(deeper).toMatchObject({ value: '112', plus: null, minus: null, full: '131 nm' });
    expect(formatWithInterval(2, [null, 4.04], null, 'nm').sentence).toBe(
      'less than 4.04 nm (68 %)',
    );
  });

  it('says when the data determine nothing', () => {
    const nothing = formatWithInterval(50, [null, null], null, 'nm');
    expect(nothing.sentence).toBe('not determined by these data (best value 50.0 nm)');
  });

  it('takes the plain value without an interval or σ', () => {
    expect(formatWithInterval(78.4123, null, null, 'nm').sentence).toBe('78.4 nm');
  });

  it('shares one power of ten between value and sides', () => {
    const parts = formatWithInterval(6.2e15, [5.8e15, 6.7e15], null, 'cm⁻³');
    expect(parts).toMatchObject({ value: '6.2', plus: '0.5', minus: '0.4', exponent: 15 });
    expect(parts.sentence).toBe('(6.2 +0.5 −0.4)×10¹⁵ cm⁻³');
    expect(formatWithInterval(6.2e15, [5.8e15, 6.6e15], null, 'cm⁻³').sentence).toBe(
      '6.2(4)×10¹⁵ cm⁻³',
    );
  });

  it('writes concentrations and probabilities', () => {
    expect(formatConcentration(6.2e15)).toBe('6.2×10¹⁵ cm⁻³');
    expect(formatConcentration(6.2e15, 4e14)).toBe('6.2(4)×10¹⁵ cm⁻³');
    expect(formatConcentration(0)).toBe('0 cm⁻³');
    expect(formatProbability(0.4512)).toBe('0.45');
    expect(formatProbability(0.00001)).toBe('below 0.0001');
  });
});
