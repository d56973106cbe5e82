import { describe, expect, it } from 'vitest';

import { profileAt, voicesAt } from '@/components/fit-desk/linked-depth';

import { sharpProfile } from '../charts/sample-data';

const shallow = { energyKeV: 2, edgesNm: [0, 50, 100], mass: [0.8, 0.2] };
const deep = { energyKeV: 20, edgesNm: [0, 50, 100], mass: [0.2, 0.8] };
const still = { depthScale: 1, capThicknessNm: 0 };

describe('energies that speak about a depth', () => {
  it('weigh as (density / σ)²: at 25 nm 0.8² against 0.2²', () => {
    const voices = voicesAt(
      25,
      [shallow, deep],
      new Map([
        [2, 0.01],
        [20, 0.01],
      ]),
      still,
    );
    expect(voices).toHaveLength(1);
    expect(voices[0]?.energyKeV).toBe(2);
    expect(voices[0]?.share).toBeCloseTo(0.64 / 0.68, 12);
  });

  it('are louder with a smaller σ', () => {
    const voices = voicesAt(
      25,
      [shallow, deep],
      new Map([
        [2, 0.04],
        [20, 0.01],
      ]),
      still,
    );
    expect(voices.map(({ energyKeV, share }) => [energyKeV, share])).toEqual([
      [2, 0.5],
      [20, 0.5],
    ]);
  });

  it('leave out points that are switched off', () => {
    expect(
      voicesAt(25, [shallow, deep], new Map([[20, 0.01]]), still).map(({ energyKeV }) => energyKeV),
    ).toEqual([20]);
  });

  it('look below the cap and through the depth scale', () => {
    // 30 nm below a cap of 30 nm is 60 nm in the stack: the deep energy's bin.
    const voices = voicesAt(
      30,
      [shallow, deep],
      new Map([
        [2, 0.01],
        [20, 0.01],
      ]),
      { depthScale: 1, capThicknessNm: 30 },
    );
    expect(voices[0]?.energyKeV).toBe(20);
    expect(
      voicesAt(99, [shallow], new Map([[2, 0.01]]), { depthScale: 0.9, capThicknessNm: 0 }),
    ).toEqual([]);
  });
});

describe('the profile at a depth', () => {
  it('is its nearest point', () => {
    expect(profileAt(sharpProfile(), 79.4)?.depthNm).toBe(80);
    expect(profileAt(sharpProfile({ points: [] }), 10)).toBeNull();
  });
});
