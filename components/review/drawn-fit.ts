import type { Fit } from '@/lib/schemas/fit';

import type { DrawnFit } from './fit-figures';

/** The part of a fit that its figures draw; the rest stays on the server. */
export function drawnFit(fit: Fit): DrawnFit {
  const { name, observable, spec, carrierProfile, edge, answer } = fit;
  const scale = answer.parameters.find((parameter) => parameter.name === 'depthScale');
  return {
    name,
    observable,
    spec,
    carrierProfile,
    edge,
    residuals: answer.residuals,
    depthScale: scale?.value ?? 1,
  };
}

/** A name that any file system takes. */
export function fileNameOf(text: string): string {
  const plain = text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[^a-z0-9]+/g, '-');
  return plain.replace(/^-+|-+$/g, '') || 'fit';
}
