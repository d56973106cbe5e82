import { readFileSync } from 'node:fs';
import type { LeastSquaresProblem } from '@/lib/inversion/fit/least-squares-problem';
import { variables, type Dual } from './dual';

export interface NistProblem {
  starts: [number[], number[]];
  certified: number[];
  standardErrors: number[];
  residualSum: number;
  problem: LeastSquaresProblem;
}

type Model = (b: Dual[], x: number[]) => Dual;

const decay = (b: Dual[], x: number[], k: number): Dual =>
  b[k]!.times(b[k + 1]!.times(-x[0]!).exp());
const bump = (b: Dual[], x: number[], k: number): Dual => {
  const z = b[k + 1]!.minus(x[0]!).over(b[k + 2]!);
  return b[k]!.times(z.times(z).times(-1).exp());
};
const polynomial = (terms: Dual[], x: number): Dual =>
  terms.slice(0, -1).reduceRight((sum, term) => sum.times(x).plus(term), terms[terms.length - 1]!);
const rational = (b: Dual[], x: number, top: number): Dual =>
  polynomial(b.slice(0, top), x).over(polynomial(b.slice(top), x).times(x).plus(1));
const wave = (period: Dual, x: number): Dual => period.inverse().times(2 * Math.PI * x);

const saturation: Model = (b, x) => b[0]!.times(b[1]!.times(-x[0]!).exp().times(-1).plus(1));
const chwirut: Model = (b, x) =>
  b[0]!
    .times(-x[0]!)
    .exp()
    .over(b[1]!.plus(b[2]!.times(x[0]!)));
const lanczos: Model = (b, x) =>
  decay(b, x, 0)
    .plus(decay(b, x, 2))
    .plus(decay(b, x, 4));
const gauss: Model = (b, x) =>
  decay(b, x, 0)
    .plus(bump(b, x, 2))
    .plus(bump(b, x, 5));

/** The models as they stand in the files. */
const MODELS: Record<string, Model> = {
  Misra1a: saturation,
  BoxBOD: saturation,
  Misra1b: (b, x) =>
    b[0]!.times(
      b[1]!
        .times(x[0]! / 2)
        .plus(1)
        .power(-2)
        .times(-1)
        .plus(1),
    ),
  Misra1c: (b, x) =>
    b[0]!.times(
      b[1]!
        .times(2 * x[0]!)
        .plus(1)
        .power(-0.5)
        .times(-1)
        .plus(1),
    ),
  Misra1d: (b, x) => b[0]!.times(b[1]!).times(x[0]!).over(b[1]!.times(x[0]!).plus(1)),
  Chwirut1: chwirut,
  Chwirut2: chwirut,
  Lanczos1: lanczos,
  Lanczos2: lanczos,
  Lanczos3: lanczos,
  Gauss1: gauss,
  Gauss2: gauss,
  Gauss3: gauss,
  DanWood: (b, x) => b[0]!.times(b[1]!.times(Math.log(x[0]!)).exp()),
  Kirby2: (b, x) => rational(b, x[0]!, 3),
  Hahn1: (b, x) => rational(b, x[0]!, 4),
  Thurber: (b, x) => rational(b, x[0]!, 4),
  Nelson: (b, x) => b[0]!.minus(b[1]!.times(x[0]!).times(b[2]!.times(-x[1]!).exp())),
  MGH17: (b, x) =>
    b[0]!.plus(b[1]!.times(b[3]!.times(-x[0]!).exp())).plus(b[2]!.times(b[4]!.times(-x[0]!).exp())),
  Roszman1: (b, x) =>
    b[0]!
      .minus(b[1]!.times(x[0]!))
      .minus(b[2]!.over(b[3]!.times(-1).plus(x[0]!)).atan().over(Math.PI)),
  ENSO: (b, x) => {
    const year = (2 * Math.PI * x[0]!) / 12;
    const pair = (k: number, period: Dual): Dual =>
      b[k]!.times(wave(period, x[0]!).cos()).plus(b[k + 1]!.times(wave(period, x[0]!).sin()));
    const annual = b[1]!.times(Math.cos(year)).plus(b[2]!.times(Math.sin(year)));
    return b[0]!.plus(annual).plus(pair(4, b[3]!)).plus(pair(7, b[6]!));
  },
  MGH09: (b, x) =>
    b[0]!.times(b[1]!.times(x[0]!).plus(x[0]! ** 2)).over(
      b[2]!
        .times(x[0]!)
        .plus(x[0]! ** 2)
        .plus(b[3]!),
    ),
  Rat42: (b, x) => b[0]!.over(b[1]!.minus(b[2]!.times(x[0]!)).exp().plus(1)),
  Rat43: (b, x) => b[0]!.over(b[1]!.minus(b[2]!.times(x[0]!)).exp().plus(1).power(b[3]!.inverse())),
  MGH10: (b, x) => b[0]!.times(b[1]!.over(b[2]!.plus(x[0]!)).exp()),
  Eckerle4: (b, x) => {
    const z = b[2]!.minus(x[0]!).over(b[1]!);
    return b[0]!.over(b[1]!).times(z.times(z).times(-0.5).exp());
  },
  Bennett5: (b, x) => b[0]!.times(b[1]!.plus(x[0]!).power(b[2]!.inverse().times(-1))),
};

export const NIST_NAMES = Object.keys(MODELS).sort();

export function nistProblem(name: string): NistProblem {
  const lines = readFileSync(`fixtures/nist/nonlinear/${name}.dat`, 'utf8').split(/\r?\n/);
  const parameters = lines.flatMap((line) => {
    const match = /^\s*b\d+ =\s+(\S+)\s+(\S+)\s+(\S+)\s+(\S+)/.exec(line);
    return match ? [match.slice(1, 5).map(Number)] : [];
  });
  const sumLine = lines.find((line) => line.includes('Residual Sum of Squares'))!;
  const dataFrom = lines.findLastIndex((line) => line.startsWith('Data:')) + 1;
  const table = lines
    .slice(dataFrom)
    .map((line) => line.trim().split(/\s+/).map(Number))
    .filter((row) => row.length >= 2);
  // Nelson is fitted to the logarithm of y, as its file says.
  const target = table.map(([y]) => (name === 'Nelson' ? Math.log(y!) : y!));
  const model = MODELS[name]!;
  const rows = table.length;
  const size = parameters.length;
  const column = (k: number): number[] => parameters.map((row) => row[k]!);
  return {
    starts: [column(0), column(1)],
    // The carried copy of Roszman1 spoils its first certified value (1.20196866396E-0 for 2.0196866396E-01, which alone has the
    // certified residual sum that the same file states).
    certified: name === 'Roszman1' ? [2.0196866396e-1, ...column(2).slice(1)] : column(2),
    standardErrors: column(3),
    residualSum: Number(sumLine.split(':')[1]),
    problem: {
      size,
      rows,
      target,
      lower: new Array<number>(size).fill(-Infinity),
      upper: new Array<number>(size).fill(Infinity),
      predict(theta, into) {
        const b = variables(theta);
        table.forEach((row, i) => {
          into[i] = model(b, row.slice(1)).value;
        });
      },
      jacobian(theta, into) {
        const b = variables(theta);
        table.forEach((row, i) => {
          model(b, row.slice(1)).by.forEach((d, k) => {
            into[k * rows + i] = d;
          });
        });
      },
    },
  };
}
