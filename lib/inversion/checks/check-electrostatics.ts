import { debyeLengthNm } from '../electrostatics/debye-length';
import { edgeElectrostatics } from '../electrostatics/edge-electrostatics';
import type { FitInput, SemiconductorBulk } from '../types';
import { figure, parameterOf, type CheckContext, type FitCheck } from './check-context';

const exact = (value: number) => ({ value, sigma: 0 });

/** The bulk of a depletion edge, where the input says it; bent bands obey electrostatics by themselves. */
function bulkOf({
  prepared,
}: CheckContext): { semiconductor: SemiconductorBulk; bulkPerCm3: number } | null {
  const { semiconductor, carriers, polarity, profile }: FitInput = prepared.input;
  const edge = profile === 'sharp' || profile === 'graded';
  return semiconductor && carriers.bulkPerCm3 && edge && polarity === 'depletion'
    ? { semiconductor, bulkPerCm3: carriers.bulkPerCm3 }
    : null;
}

/**
 * σ of the carriers at the edge of a depletion layer over L_D: in depletion v = ξ²/2, so e^(−v) falls from 84 % to 16 % over
 * √(2 ln 6.25) − √(2 ln 1.19) = 1.32 L_D, which is two σ.
 */
const EDGE_IN_LENGTHS = 0.66;

/** Carriers cannot end more sharply than they screen. */
export const checkDebyeLength: FitCheck = (context) => {
  const bulk = bulkOf(context);
  if (!bulk) return null;
  const { semiconductor, bulkPerCm3 } = bulk;
  const length = debyeLengthNm({
    bulkPerCm3: exact(bulkPerCm3),
    relativePermittivity: exact(semiconductor.relativePermittivity),
    temperatureK: exact(semiconductor.temperatureK),
  }).value;
  const width = parameterOf(context, 'edgeWidthNm');
  const widest = width ? (width.held ? width.value : width.interval95[1]) : 0;
  const id = 'debye-length';
  const least = EDGE_IN_LENGTHS * length;
  const seen = `screening over a Debye length of ${figure(length)} nm makes it at least ${figure(least)} nm wide`;
  return widest !== null && widest < least
    ? {
        id,
        state: 'caution',
        message: `The edge is sharper than carriers can end: ${seen}. The response may not be linear, or the bulk concentration another.`,
      }
    : { id, state: 'fine', message: `The width of the edge is possible: ${seen}.` };
};

/** Whether the depth of the edge asks for bands that bend by more than the gap. */
export const checkBandBending: FitCheck = (context) => {
  const bulk = bulkOf(context);
  const gapEv = bulk?.semiconductor.gapEv ?? null;
  if (!bulk || gapEv === null) return null;
  const { value, sigma } = parameterOf(context, 'edgeDepthNm')!;
  if (!(value > 0)) return null;
  const { bandBendingEv } = edgeElectrostatics({
    edgeDepthNm: { value, sigma: sigma ?? 0 },
    dopingPerCm3: exact(bulk.bulkPerCm3),
    relativePermittivity: exact(bulk.semiconductor.relativePermittivity),
  });
  const id = 'band-bending';
  const seen = `an edge at ${figure(value)} nm in ${figure(bulk.bulkPerCm3)} cm⁻³ bends the bands by ${figure(bandBendingEv.value)} eV, with a gap of ${figure(gapEv)} eV`;
  return bandBendingEv.value > gapEv + 2 * bandBendingEv.sigma
    ? {
        id,
        state: 'problem',
        message: `The depth does not go with the bulk concentration: ${seen}.`,
      }
    : { id, state: 'fine', message: `The depth goes with the bulk concentration: ${seen}.` };
};
