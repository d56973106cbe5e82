import { parseArgs } from 'node:util';
import {
  DEFAULT_RESAMPLES,
  MAX_RESAMPLES,
  type Observable,
  type Polarity,
  type ProfileKind,
  type ResponseKind,
} from '@/lib/inversion/index';
import type { DepthUnit } from '@/lib/files/stopping-file';
import { BadInput } from './bad-input';

export interface InvertOptions {
  scan: string;
  stopping: string[];
  depthUnit: DepthUnit | null;
  energyUnit: 'keV' | 'eV' | null;
  observable: Observable;
  response: ResponseKind;
  profile: ProfileKind;
  polarity: Polarity;
  gammaCm3PerS: number | null;
  baselinePerUs: number;
  bulkPerCm3: number | null;
  capThicknessNm: number;
  depthScaleFree: boolean;
  resamples: number;
  seed: number;
  json: boolean;
}

const RESPONSE_OF = { fraction: 'two-level', rate: 'capture-rate' } as const;
const LARGEST_SEED = 4_294_967_295;

const FLAGS = {
  scan: { type: 'string' },
  stopping: { type: 'string', multiple: true },
  'depth-unit': { type: 'string' },
  'energy-unit': { type: 'string' },
  observable: { type: 'string' },
  response: { type: 'string' },
  profile: { type: 'string' },
  polarity: { type: 'string' },
  gamma: { type: 'string' },
  baseline: { type: 'string' },
  'bulk-concentration': { type: 'string' },
  'cap-thickness': { type: 'string' },
  'depth-scale': { type: 'string' },
  resamples: { type: 'string' },
  seed: { type: 'string' },
  json: { type: 'boolean' },
  help: { type: 'boolean' },
} as const;

/** What the command line asks for; `help` when it asks for that. Throws BadInput. */
export function parseOptions(args: readonly string[]): InvertOptions | 'help' {
  const { values, stopping } = parseFlags(args);
  if (values.help) return 'help';
  if (values.scan === undefined) bad('--scan: name the file of the energy scan.');
  if (stopping.length === 0) bad('--stopping: name the file or files of the stopping profiles.');
  const { observable, response } = whatIsMeasured(values.observable, values.response);
  const gammaCm3PerS = number('--gamma', values.gamma, { above: 0 });
  if (response === 'capture-rate' && gammaCm3PerS === null) {
    bad('--gamma: the capture-rate response needs the capture coefficient in cm³/s.');
  }
  return {
    scan: values.scan,
    stopping,
    depthUnit: choice('--depth-unit', values['depth-unit'], ['nm', 'A', 'um']),
    energyUnit: choice('--energy-unit', values['energy-unit'], ['keV', 'eV']),
    observable,
    response,
    profile: choice('--profile', values.profile, ['sharp', 'graded']) ?? 'graded',
    polarity: choice('--polarity', values.polarity, ['depletion', 'accumulation']) ?? 'depletion',
    gammaCm3PerS,
    baselinePerUs: number('--baseline', values.baseline, { min: 0 }) ?? 0,
    bulkPerCm3: number('--bulk-concentration', values['bulk-concentration'], { above: 0 }),
    capThicknessNm: number('--cap-thickness', values['cap-thickness'], { min: 0 }) ?? 0,
    depthScaleFree: choice('--depth-scale', values['depth-scale'], ['held', 'free']) === 'free',
    resamples: whole('--resamples', values.resamples, MAX_RESAMPLES) ?? DEFAULT_RESAMPLES,
    seed: whole('--seed', values.seed, LARGEST_SEED) ?? 1,
    json: values.json ?? false,
  };
}

/** Files may follow --stopping one after the other; anything else that stands alone is a mistake. */
function parseFlags(args: readonly string[]) {
  const { values, tokens } = readFlags(args);
  const stopping: string[] = [];
  let last = '';
  for (const token of tokens) {
    if (token.kind === 'option') last = token.name;
    if (token.kind === 'option' && token.name === 'stopping') stopping.push(token.value ?? '');
    if (token.kind !== 'positional') continue;
    if (last !== 'stopping')
      bad(`"${token.value}": an option such as --scan or --stopping must come before it.`);
    stopping.push(token.value);
  }
  return { values, stopping };
}

function readFlags(args: readonly string[]) {
  try {
    return parseArgs({ args: [...args], options: FLAGS, allowPositionals: true, tokens: true });
  } catch (cause) {
    // parseArgs says what is unknown or lacks a value, in a sentence of its own.
    if (cause instanceof TypeError) throw new BadInput([cause.message.split('. ')[0] + '.']);
    throw cause;
  }
}

function whatIsMeasured(
  observableText: string | undefined,
  responseText: string | undefined,
): { observable: Observable; response: ResponseKind } {
  const given = choice('--response', responseText, ['two-level', 'capture-rate']);
  const fallback = given === 'capture-rate' ? 'rate' : 'fraction';
  const observable = choice('--observable', observableText, ['fraction', 'rate']) ?? fallback;
  const response = given ?? RESPONSE_OF[observable];
  if (response !== RESPONSE_OF[observable]) {
    bad(`--response: a ${observable} goes with ${RESPONSE_OF[observable]}, not with ${response}.`);
  }
  return { observable, response };
}

function choice<const T extends string>(
  name: string,
  text: string | undefined,
  allowed: readonly T[],
): T | null {
  if (text === undefined) return null;
  const found = allowed.find((one) => one === text);
  return found ?? bad(`${name}: expected ${allowed.join(' or ')}, found "${text}".`);
}

function number(
  name: string,
  text: string | undefined,
  { min = -Infinity, above = -Infinity }: { min?: number; above?: number },
): number | null {
  if (text === undefined) return null;
  const value = text.trim() === '' ? Number.NaN : Number(text);
  if (Number.isFinite(value) && value >= min && value > above) return value;
  return bad(
    `${name}: expected a number ${above > -Infinity ? `above ${above}` : `of ${min} or more`}, found "${text}".`,
  );
}

function whole(name: string, text: string | undefined, max: number): number | null {
  if (text === undefined) return null;
  const value = /^\d+$/.test(text) ? Number(text) : Number.NaN;
  return value <= max
    ? value
    : bad(`${name}: expected a whole number from 0 to ${max}, found "${text}".`);
}

function bad(reason: string): never {
  throw new BadInput([reason]);
}
