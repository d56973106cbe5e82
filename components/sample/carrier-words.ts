import { asEntered, formatConcentration } from '@/lib/format';
import type { Sample } from '@/lib/schemas/sample';

/** "n-type" for electrons, "p-type" for holes. */
export function dopingType(carrier: Sample['carrier']): string {
  return carrier === 'electrons' ? 'n-type' : 'p-type';
}

/** "6.2(4)×10¹⁵ cm⁻³"; null when nothing is known. */
export function dopingText(
  sample: Pick<Sample, 'dopingPerCm3' | 'dopingSigmaPerCm3'>,
): string | null {
  if (sample.dopingPerCm3 === null) return null;
  return formatConcentration(sample.dopingPerCm3, sample.dopingSigmaPerCm3);
}

/** "25 nm SiO₂"; null when the surface is bare. */
export function capText(sample: Pick<Sample, 'capMaterial' | 'capThicknessNm'>): string | null {
  const thickness = sample.capThicknessNm ? `${asEntered(sample.capThicknessNm)} nm` : '';
  return [thickness, sample.capMaterial].filter((part) => part !== '').join(' ') || null;
}
