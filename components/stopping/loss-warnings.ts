import { significant } from '@/lib/format';

/** Share of implanted muons that may miss the bins before it is said (common practice, no source). */
const LARGEST_QUIET_LOSS = 0.02;

/** A sentence for each energy at which more than 2 % of the muons did not stop within the bins. */
export function lossWarnings(
  profiles: readonly { energyKeV: number; lostShare: number | null }[],
): string[] {
  return profiles
    .filter(({ lostShare }) => lostShare !== null && lostShare > LARGEST_QUIET_LOSS)
    .map(
      ({ energyKeV, lostShare }) =>
        `At ${energyKeV} keV ${significant((lostShare ?? 0) * 100, 2)} % of the muons did not stop within the depths given: they came back out or went deeper.`,
    );
}
