import type { TrialProfile } from '../profile/trial-profile';
import type { CarrierScale, FitInput, Polarity, ProfileUnit, Response } from '../types';

/** Concentration (or share) as a linear function of the populated share: value = offset + slope·s. */
export interface ConcentrationLine {
  offset: number;
  slope: number;
}

/**
 * How an observable follows from the carriers: ŷ = top + (bulk − top)·g(s), so the levels are linear parameters. g is s itself
 * unless the response bends it.
 * A new one is one file that exports this and one line in responses.ts.
 */
export interface ResponseModel {
  observable: FitInput['observable'];
  /** Lowest and highest level that means anything. */
  levelBounds(response: Response): readonly [number, number];
  capBounds: readonly [number, number];
  /** The trial profile with g(s) for its fold; left out where g(s) = s. */
  seen?(trial: TrialProfile, input: FitInput): TrialProfile;
  unit(response: Response, carriers: CarrierScale, polarity: Polarity): ProfileUnit;
  /** Profile value at levels (top, bulk). */
  line(
    levelTop: number,
    levelBulk: number,
    input: Pick<FitInput, 'response' | 'carriers' | 'polarity'>,
  ): ConcentrationLine;
  /** Change of the profile value that moves the observable by `change`, at this contrast of the levels. */
  valueOfChange(
    change: number,
    contrast: number,
    input: Pick<FitInput, 'response' | 'carriers' | 'polarity'>,
  ): number;
}
