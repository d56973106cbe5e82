import { InversionError } from '../errors';
import { checkPositive } from './estimate';

/** A handbook number, its standard uncertainty where the source gives one, and the source. */
export interface Sourced {
  value: number;
  sigma: number | null;
  source: string;
}

/** What the electrostatics needs to know of a semiconductor. */
export interface Semiconductor {
  name: string;
  /** ε_r, static. */
  relativePermittivity: Sourced;
  /** Varshni: E_g(T) = E_g(0) − α·T²/(T + β), eV with α in eV/K and β in K. */
  gap: { atZeroEv: Sourced; alphaEvPerK: Sourced; betaK: Sourced };
  /** Effective densities of states at 300 K; both go as T^(3/2). */
  conductionStatesPerCm3: Sourced;
  valenceStatesPerCm3: Sourced;
  /** m over the electron mass, for v_th = √(8kT/(πm)): how fast carriers meet a trap. */
  electronMass: Sourced;
  holeMass: Sourced;
}

/**
 * Lets a material of the user's own through, or says which number cannot be.
 *
 * @throws InversionError for a missing name or source, a number that is not positive and finite, a negative σ.
 */
export function checkSemiconductor(material: Semiconductor): Semiconductor {
  if (material.name.trim() === '')
    throw new InversionError('bad-material', 'The material needs a name.');
  const { gap } = material;
  const numbers: readonly (readonly [Sourced, string, string])[] = [
    [material.relativePermittivity, 'relative permittivity', 'ε₀'],
    [gap.atZeroEv, 'gap at 0 K', 'eV'],
    [material.conductionStatesPerCm3, 'conduction-band density of states', 'cm⁻³'],
    [material.valenceStatesPerCm3, 'valence-band density of states', 'cm⁻³'],
    [material.electronMass, 'electron mass', 'electron masses'],
    [material.holeMass, 'hole mass', 'electron masses'],
  ];
  for (const [number, name, unit] of numbers) {
    checkPositive(number.value, { name: `${name} of ${material.name}`, unit });
    checkSourced(number, name, material.name);
  }
  for (const [number, name] of [
    [gap.alphaEvPerK, 'Varshni α'],
    [gap.betaK, 'Varshni β'],
  ] as const) {
    if (!(number.value >= 0 && Number.isFinite(number.value))) {
      throw new InversionError(
        'bad-material',
        `${name} of ${material.name} cannot be ${number.value}.`,
      );
    }
    checkSourced(number, name, material.name);
  }
  return material;
}

function checkSourced({ sigma, source }: Sourced, name: string, material: string): void {
  if (sigma !== null && !(sigma >= 0 && Number.isFinite(sigma))) {
    throw new InversionError(
      'bad-material',
      `The uncertainty of the ${name} of ${material} cannot be ${sigma}.`,
    );
  }
  if (source.trim() === '') {
    throw new InversionError('bad-material', `The ${name} of ${material} needs a source.`);
  }
}
