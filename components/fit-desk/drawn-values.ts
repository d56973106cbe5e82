import type {
  FitAnswer,
  FitParameter,
  ParameterName,
  ParameterValues,
  ScanPoint,
} from '@/lib/inversion/index';

/** Parameters that can be drawn by hand. */
export const DRAWABLE = ['edgeDepthNm', 'levelTop', 'levelBulk'] as const;
export type Drawable = (typeof DRAWABLE)[number];
export type Drawn = Partial<Record<Drawable, number>>;

/** A drawn value to four digits: a hand does not draw more, and an address should be readable. */
export function asDrawn(value: number): number {
  return Number(value.toPrecision(4));
}

export function answerValues(answer: Pick<FitAnswer, 'parameters'>): ParameterValues {
  return Object.fromEntries(answer.parameters.map(({ name, value }) => [name, value]));
}

/**
 * Values to draw with: what is held, then what was fitted, then a plain guess from the scan, and over
 * all of them what was drawn by hand. A fit never starts from these.
 */
export function valuesToDraw({
  names,
  fitted,
  held,
  points,
  deepestNm,
  drawn,
}: {
  names: readonly ParameterName[];
  fitted: ParameterValues;
  held: ParameterValues;
  points: readonly ScanPoint[];
  deepestNm: number;
  drawn: Drawn;
}): ParameterValues {
  const guess = guessedValues(points, deepestNm);
  return Object.fromEntries(
    names.map((name) => [
      name,
      (drawn as ParameterValues)[name] ?? held[name] ?? fitted[name] ?? guess[name],
    ]),
  );
}

function guessedValues(points: readonly ScanPoint[], deepestNm: number): ParameterValues {
  const used = points.filter((point) => point.enabled).sort((a, b) => a.energyKeV - b.energyKeV);
  const [top, bulk] = [used[0]?.value ?? 0, used.at(-1)?.value ?? 0];
  return {
    edgeDepthNm: deepestNm / 3,
    edgeWidthNm: deepestNm / 20,
    levelTop: top,
    levelBulk: bulk,
    levelCap: top,
    depthScale: 1,
  };
}

/** One press of an arrow key: a tenth of the 68 % interval, or a hundredth of the range where there is none. */
export function arrowStep(
  parameter: Pick<FitParameter, 'interval68' | 'sigma'> | null,
  range: number,
): number {
  const [low, high] = parameter?.interval68 ?? [null, null];
  const length = low !== null && high !== null ? high - low : (parameter?.sigma ?? 0) * 2;
  return length > 0 ? length / 10 : range / 100;
}

/** Where a key moves a handle; null for a key that does not. Page keys go ten steps. */
export function movedByKey(
  key: string,
  value: number,
  { step, min, max }: { step: number; min: number; max: number },
): number | null {
  const moves: Record<string, number> = {
    ArrowRight: value + step,
    ArrowUp: value + step,
    ArrowLeft: value - step,
    ArrowDown: value - step,
    PageUp: value + 10 * step,
    PageDown: value - 10 * step,
    Home: min,
    End: max,
  };
  const moved = moves[key];
  return moved === undefined ? null : Math.min(max, Math.max(min, moved));
}

/** χ² of the data for a drawn curve. */
export function drawnChiSquare(points: readonly ScanPoint[], predicted: ArrayLike<number>): number {
  return points.reduce(
    (sum, point, index) =>
      point.enabled ? sum + ((point.value - predicted[index]!) / point.sigma) ** 2 : sum,
    0,
  );
}
