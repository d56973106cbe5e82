import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import {
  settingOf,
  withSetting,
  type Assumptions,
  type Setting,
} from '@/components/fit-desk/assumptions';
import { fromAddress, toAddress } from '@/components/fit-desk/assumptions-address';
import { PARAMETER_NAMES } from '@/lib/schemas/fit';

import { assumptions, SET_ID } from './desk-data';

const positive = fc.double({ min: 1e-9, max: 1e20, noNaN: true });
const setting: fc.Arbitrary<Setting> = fc.record({
  held: fc.boolean(),
  value: fc.double({ min: -1e6, max: 1e6, noNaN: true }).filter((value) => !Object.is(value, -0)),
  prior: fc.option(fc.record({ mean: positive, sigma: positive })),
  origin: fc.string({ maxLength: 40 }),
});

/** What an address must carry; the value of a free parameter plays no part and is not in it. */
const meaning = (one: Assumptions) => ({
  ...one,
  parameters: PARAMETER_NAMES.map((name) => {
    const { held, value, prior, origin } = settingOf(one, name);
    return { name, held, value: held ? value : null, prior, origin };
  }),
});

describe('the address of a desk', () => {
  it('brings back what it was made from', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('fraction' as const, 'rate' as const),
        fc.constantFrom('sharp' as const, 'graded' as const),
        fc.constantFrom('depletion' as const, 'accumulation' as const),
        fc.uniqueArray(fc.double({ min: 0.1, max: 60, noNaN: true }), { maxLength: 5 }),
        fc.array(fc.tuple(fc.constantFrom(...PARAMETER_NAMES), setting), { maxLength: 4 }),
        fc.option(positive),
        fc.nat(4_294_967_295),
        (observable, profile, polarity, switchedOffKeV, settings, bulkPerCm3, seed) => {
          const defaults = assumptions(observable);
          let made: Assumptions = {
            ...defaults,
            profile,
            polarity,
            switchedOffKeV,
            seed,
            carriers: { ...defaults.carriers, bulkPerCm3 },
          };
          for (const [name, one] of settings) made = withSetting(made, name, one);
          const { assumptions: read, unread } = fromAddress(toAddress(made, defaults), defaults);
          expect(unread).toEqual([]);
          expect(meaning(read)).toEqual(meaning(made));
        },
      ),
    );
  });

  it('names the stopping set always and everything else only where it differs', () => {
    const said = Object.entries(toAddress(assumptions(), assumptions())).filter(
      ([, text]) => text !== null,
    );
    expect(said).toEqual([['stopping', SET_ID]]);
  });

  it('leaves what it cannot read as usual, and names it', () => {
    const defaults = assumptions();
    const { assumptions: read, unread } = fromAddress(
      {
        profile: 'wavy',
        seed: '-3',
        edge: 'held:deep',
        off: '4,x',
        gamma: '1e-6',
        resamples: '500',
        cap: '',
      },
      defaults,
    );
    expect(unread.sort()).toEqual(['cap', 'edge', 'gamma', 'off', 'profile', 'seed']);
    expect(read).toEqual({ ...defaults, resamples: 500 });
  });

  it('reads "none" as not known, never as zero', () => {
    expect(
      fromAddress({ carriers: 'none' }, assumptions()).assumptions.carriers.bulkPerCm3,
    ).toBeNull();
    expect(fromAddress({ carriers: '0' }, assumptions()).unread).toEqual(['carriers']);
  });
});
