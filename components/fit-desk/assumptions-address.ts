import { MAX_RESAMPLES, type ParameterName } from '@/lib/inversion/index';
import { PARAMETER_NAMES } from '@/lib/schemas/fit';

import { settingOf, withSetting, type Assumptions, type Setting } from './assumptions';
import { PROFILE_KINDS } from './profile-kinds';

/** Words of the address; each stands only when it differs from what the scan and its sample give. */
const PARAMETER_WORDS: Record<ParameterName, string> = {
  edgeDepthNm: 'edge',
  edgeWidthNm: 'width',
  layerThicknessNm: 'thickness',
  farEdgeWidthNm: 'farWidth',
  surfacePotentialEv: 'bending',
  bulkPerCm3: 'bulkCarriers',
  levelTop: 'top',
  levelBulk: 'bulk',
  levelCap: 'capLevel',
  depthScale: 'scale',
};
const NUMBER_WORDS = [
  'gamma',
  'gammaSigma',
  'baseline',
  'carriers',
  'carriersSigma',
  'carriersTop',
  'cap',
  'seed',
  'resamples',
] as const;
type NumberWord = (typeof NUMBER_WORDS)[number];

export const ADDRESS_WORDS = [
  'stopping',
  'profile',
  'polarity',
  'off',
  ...NUMBER_WORDS,
  ...Object.values(PARAMETER_WORDS),
] as const;

export type Address = Record<string, string | null>;

/** The assumptions as an address. */
export function toAddress(assumptions: Assumptions, defaults: Assumptions): Address {
  const address: Address = {};
  const put = (word: string, text: string, usual: string) =>
    (address[word] = text === usual ? null : text);
  put('stopping', assumptions.stoppingSetId ?? '', '');
  put('profile', assumptions.profile, defaults.profile);
  put('polarity', assumptions.polarity, defaults.polarity);
  put('off', assumptions.switchedOffKeV.join(','), defaults.switchedOffKeV.join(','));
  const [numbers, usual] = [numbersOf(assumptions), numbersOf(defaults)];
  for (const word of NUMBER_WORDS) put(word, numberText(numbers[word]), numberText(usual[word]));
  for (const name of PARAMETER_NAMES) {
    put(
      PARAMETER_WORDS[name],
      settingText(settingOf(assumptions, name)),
      settingText(settingOf(defaults, name)),
    );
  }
  return address;
}

/** The assumptions that an address names, and the words in it that could not be read. */
export function fromAddress(
  address: Address,
  defaults: Assumptions,
): { assumptions: Assumptions; unread: string[] } {
  const unread: string[] = [];
  let read = { ...defaults };
  const take = (word: string, reader: (text: string) => Assumptions | null) => {
    const text = address[word];
    if (text === null || text === undefined) return;
    const next = reader(text);
    if (next) read = next;
    else unread.push(word);
  };
  take('stopping', (text) => ({ ...read, stoppingSetId: text }));
  take('profile', (text) => {
    const entry = PROFILE_KINDS.find(({ kind }) => kind === text);
    return entry ? { ...read, profile: entry.kind } : null;
  });
  take('polarity', (text) =>
    text === 'depletion' || text === 'accumulation' ? { ...read, polarity: text } : null,
  );
  take('off', (text) => {
    const energies = text === '' ? [] : text.split(',').map(Number);
    return energies.every((energy) => energy > 0) ? { ...read, switchedOffKeV: energies } : null;
  });
  for (const word of NUMBER_WORDS) take(word, (text) => withNumber(read, word, text));
  for (const name of PARAMETER_NAMES) {
    take(PARAMETER_WORDS[name], (text) => {
      const setting = settingFrom(text);
      return setting ? withSetting(read, name, setting) : null;
    });
  }
  return { assumptions: read, unread };
}

function numbersOf({
  response,
  carriers,
  capThicknessNm,
  seed,
  resamples,
}: Assumptions): Record<NumberWord, number | null> {
  const rate = response.kind === 'capture-rate' ? response : null;
  return {
    gamma: rate?.gammaCm3PerS ?? null,
    gammaSigma: rate?.gammaSigmaCm3PerS ?? null,
    baseline: rate?.baselinePerUs ?? null,
    carriers: carriers.bulkPerCm3,
    carriersSigma: carriers.bulkSigmaPerCm3,
    carriersTop: carriers.topPerCm3,
    cap: capThicknessNm,
    seed,
    resamples,
  };
}

const numberText = (value: number | null): string => (value === null ? 'none' : String(value));

function withNumber(from: Assumptions, word: NumberWord, text: string): Assumptions | null {
  const value = text === 'none' ? null : text === '' ? NaN : Number(text);
  if (value !== null && !(value >= 0 && Number.isFinite(value))) return null;
  const { carriers, response } = from;
  switch (word) {
    case 'carriers':
      return value === 0 ? null : { ...from, carriers: { ...carriers, bulkPerCm3: value } };
    case 'carriersSigma':
      return { ...from, carriers: { ...carriers, bulkSigmaPerCm3: value } };
    case 'carriersTop':
      return { ...from, carriers: { ...carriers, topPerCm3: value } };
    case 'cap':
      return value === null || value > 10_000 ? null : { ...from, capThicknessNm: value };
    case 'seed':
      return value === null || !Number.isInteger(value) || value > 4_294_967_295
        ? null
        : { ...from, seed: value };
    case 'resamples':
      return value === null || !Number.isInteger(value) || value > MAX_RESAMPLES
        ? null
        : { ...from, resamples: value };
  }
  if (response.kind !== 'capture-rate') return null;
  if (word === 'gammaSigma')
    return { ...from, response: { ...response, gammaSigmaCm3PerS: value } };
  if (word === 'baseline')
    return value === null ? null : { ...from, response: { ...response, baselinePerUs: value } };
  return !value ? null : { ...from, response: { ...response, gammaCm3PerS: value } };
}

/** `free`, `held 78.4`, `free 1 ± 0.03`; an origin follows after a semicolon. */
function settingText({ held, value, prior, origin }: Setting): string {
  const words = [
    held ? `held:${value ?? ''}` : 'free',
    prior ? `prior:${prior.mean}:${prior.sigma}` : null,
  ];
  return [...words.filter((word) => word !== null), ...(origin ? [`origin:${origin}`] : [])].join(
    ';',
  );
}

function settingFrom(text: string): Setting | null {
  const match = /^(?:(free)|held:([^;]*))(?:;prior:([^;:]+):([^;:]+))?(?:;origin:(.*))?$/s.exec(
    text,
  );
  if (!match) return null;
  const [, free, value, mean, sigma, origin = ''] = match;
  const heldAt = value === undefined || value === '' ? null : Number(value);
  const prior = mean === undefined ? null : { mean: Number(mean), sigma: Number(sigma) };
  if (heldAt !== null && !Number.isFinite(heldAt)) return null;
  if (prior && !(Number.isFinite(prior.mean) && prior.sigma > 0 && Number.isFinite(prior.sigma)))
    return null;
  return { held: free === undefined, value: heldAt, prior, origin: origin.slice(0, 200) };
}
