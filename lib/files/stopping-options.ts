import type { DepthUnit } from './guess-stopping-layout';

export interface StoppingReadOptions {
  depthUnit: DepthUnit;
  /** centres by default; with edges each line gives the lower edge of a bin and the last line closes the last one. */
  positionsAre?: 'centres' | 'edges';
  weightsAre: 'counts' | 'density';
  /** One per profile in the order of guessStoppingLayout, or one per file; null leaves what the file says. */
  energiesKeV?: readonly (number | null)[];
  /** Lines switched off, by file name. */
  skipLines?: Readonly<Record<string, readonly number[]>>;
  /** Muons implanted per energy: with counts it gives the share that did not stop inside the bins. */
  implantedPerEnergy?: number | null;
}
