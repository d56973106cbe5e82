import { demoFits } from './fits';
import { demoPeople } from './people';
import { demoScans } from './scans';
import { demoStoppingSets } from './stopping-sets';
import type { DemoData } from './types';
import { demoSamples } from './wafers';

/** The whole demo team as plain data: the same seed gives the same bytes. */
export function generateDemo(seed: number): DemoData {
  const stoppingSets = demoStoppingSets();
  return {
    seed,
    invented: true,
    team: { name: 'Northbank Power Devices', invented: true },
    people: demoPeople(),
    samples: demoSamples(),
    stoppingSets,
    scans: demoScans(seed, stoppingSets),
    fits: demoFits(seed),
  };
}
