import type { PreparedFit } from '../fit/prepared-fit';
import type { CarrierProfile, Check, FitAnswer, FitParameter, ParameterName } from '../types';

/** What a check looks at. */
export interface CheckContext {
  prepared: PreparedFit;
  answer: FitAnswer;
  profile: CarrierProfile;
}

/** A check of one concern; null where it does not apply to this fit. */
export type FitCheck = (context: CheckContext) => Check | null;

export function parameterOf(
  { answer }: CheckContext,
  name: ParameterName,
): FitParameter | undefined {
  return answer.parameters.find((parameter) => parameter.name === name);
}

/** The parameter that says where the profile lies: the depth of its first edge, or how far the bands bend. */
export function locatorOf({ answer }: CheckContext): FitParameter {
  return answer.parameters[0]!;
}

/** What a sentence calls the locator, and its unit. */
export function locatorWords({ name }: FitParameter): { what: string; unit: string } {
  return name === 'surfacePotentialEv'
    ? { what: 'band bending', unit: 'eV' }
    : { what: 'edge', unit: 'nm' };
}

export const percent = (share: number): string => `${Number((100 * share).toPrecision(2))} %`;
export const figure = (value: number): string => String(Number(value.toPrecision(3)));

export function listOf(words: readonly string[]): string {
  return words.length < 2
    ? words.join('')
    : `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]!}`;
}
