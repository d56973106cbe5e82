import { bandsByDelta } from '../uncertainty/delta-bands';
import type { Bands } from '../uncertainty/bands';
import { valuesOf } from '../fit/theta-of';
import type { PreparedFit } from '../fit/prepared-fit';
import { RESPONSES } from '../response/responses';
import type { CarrierProfile, FitAnswer, Flag } from '../types';
import { defaultDepthGrid } from './default-depth-grid';
import { floorOf } from './floor';
import { carriersAt, profileValue } from './profile-value';
import { reachOf } from './reach';

/**
 * The carrier profile of a fit: value, bands and flag per depth below the cap. Without resamples the bands come from the
 * covariance. Flags: 'beyond reach' below the 95 % stopping quantile of the deepest enabled energy, else 'below floor' where
 * the value is smaller than any point could notice, else 'supported'.
 *
 * @param options.depthsNm depths wanted, nm below the cap; the default grid when left out.
 */
export function carrierProfile(
  prepared: PreparedFit,
  answer: FitAnswer,
  bands?: Bands | null,
  options: { depthsNm?: ArrayLike<number> } = {},
): CarrierProfile {
  const { input } = prepared;
  const values = valuesOf(answer);
  const depthsNm = bands
    ? bands.depthsNm
    : Float64Array.from(options.depthsNm ?? defaultDepthGrid(prepared, answer));
  const shown = bands ?? bandsByDelta(prepared, answer, depthsNm);
  const reachNm = reachOf(prepared, values);
  const floor = floorOf(prepared, values);
  const value = profileValue(prepared, values);
  return {
    unit: RESPONSES[input.response.kind].unit(
      input.response,
      carriersAt(input, values),
      input.polarity,
    ),
    bands: shown?.kind ?? null,
    points: Array.from(depthsNm, (depthNm, k) => ({
      depthNm,
      value: value(depthNm),
      lower68: shown ? shown.lower68[k]! : null,
      upper68: shown ? shown.upper68[k]! : null,
      lower95: shown ? shown.lower95[k]! : null,
      upper95: shown ? shown.upper95[k]! : null,
      flag: flagOf(depthNm, value(depthNm), reachNm, floor),
    })),
    reachNm,
    floor,
  };
}

function flagOf(depthNm: number, value: number, reachNm: number, floor: number | null): Flag {
  if (depthNm > reachNm) return 'beyond reach';
  return floor !== null && value < floor ? 'below floor' : 'supported';
}
