import type { ResponseKind } from '../types';
import { captureRate } from './capture-rate';
import type { ResponseModel } from './response-model';
import { saturatingFraction } from './saturating-fraction';
import { twoLevel } from './two-level';

export const RESPONSES: Readonly<Record<ResponseKind, ResponseModel>> = {
  'two-level': twoLevel,
  'capture-rate': captureRate,
  'saturating-fraction': saturatingFraction,
};
