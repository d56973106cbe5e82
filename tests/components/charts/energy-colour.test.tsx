import { describe, expect, it } from 'vitest';

import { energyColour, energyRange } from '@/components/charts/energy-colour';

describe('colour of an energy', () => {
  it('starts and ends at the first and last stop of the theme', () => {
    expect(energyColour(2, [2, 22])).toContain('var(--energy-1) 0.0%, var(--energy-0)');
    expect(energyColour(22, [2, 22])).toContain('var(--energy-5) 100.0%, var(--energy-4)');
  });

  it('stays inside the ramp for energies outside the range', () => {
    expect(energyColour(1, [2, 22])).toBe(energyColour(2, [2, 22]));
    expect(energyColour(40, [2, 22])).toBe(energyColour(22, [2, 22]));
  });

  it('takes the middle for a single energy', () => {
    expect(energyColour(5, [5, 5])).toContain('var(--energy-3) 50.0%, var(--energy-2)');
  });

  it('has a range for an empty list', () => expect(energyRange([])).toEqual([0, 1]));
});
