import type { CarrierProfile, Residual } from '@/lib/inversion/index';

/** An invented sharp profile: nothing to 80 nm, 6e15 cm⁻³ beyond, reach 160 nm. */
export function sharpProfile(change: Partial<CarrierProfile> = {}): CarrierProfile {
  return {
    unit: 'cm⁻³',
    bands: 'bootstrap',
    points: Array.from({ length: 101 }, (_, i) => {
      const depthNm = i * 2;
      const value = depthNm < 80 ? 0 : 6e15;
      return {
        depthNm,
        value,
        lower68: value * 0.9,
        upper68: value * 1.1,
        lower95: value * 0.8,
        upper95: value * 1.2,
        flag: depthNm > 160 ? 'beyond reach' : depthNm < 80 ? 'below floor' : 'supported',
      };
    }),
    reachNm: 160,
    floor: 3e14,
    ...change,
  };
}

export function residual(energyKeV: number, change: Partial<Residual> = {}): Residual {
  return {
    energyKeV,
    observed: 0.8 - energyKeV / 50,
    sigma: 0.01,
    predicted: 0.79 - energyKeV / 50,
    reduced: 1,
    enabled: true,
    interpolated: false,
    ...change,
  };
}

export const ridge = (energyKeV: number) => ({
  energyKeV,
  edgesNm: [0, 50, 100, 150, 200],
  mass: [0.4, 0.3, 0.2, 0.1],
});
