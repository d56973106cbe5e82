import { readFileSync } from 'node:fs';
import type { LeastSquaresProblem } from '@/lib/inversion/fit/least-squares-problem';

export interface NistLinearProblem {
  certified: number[];
  standardErrors: number[];
  residualSum: number;
  degreesOfFreedom: number;
  problem: LeastSquaresProblem;
}

type Design = (x: number[]) => number[];

const powers =
  (degree: number): Design =>
  ([x]) =>
    Array.from({ length: degree + 1 }, (_, k) => x! ** k);

/** Row of the design matrix of each model as it stands in the file. */
const DESIGNS: Record<string, Design> = {
  Norris: powers(1),
  Pontius: powers(2),
  NoInt1: (x) => x,
  NoInt2: (x) => x,
  Longley: (x) => [1, ...x],
  Filip: powers(10),
  Wampler1: powers(5),
  Wampler2: powers(5),
  Wampler3: powers(5),
  Wampler4: powers(5),
  Wampler5: powers(5),
};

export const NIST_LINEAR_NAMES = Object.keys(DESIGNS);

export function nistLinearProblem(name: string): NistLinearProblem {
  const lines = readFileSync(`fixtures/nist/linear/${name}.dat`, 'utf8').split(/\r?\n/);
  const parameters = lines.flatMap((line) => {
    const match = /^\s*B\d+\s+(\S+)\s+(\S+)\s*$/.exec(line);
    return match ? [match.slice(1, 3).map(Number)] : [];
  });
  const residual = /^Residual\s+(\d+)\s+(\S+)/;
  const [, freedom, sum] = residual.exec(lines.find((line) => residual.test(line))!)!;
  const table = lines
    .slice(lines.findLastIndex((line) => line.startsWith('Data:')) + 1)
    .map((line) => line.trim().split(/\s+/).map(Number))
    .filter((row) => row.length >= 2);
  const design = table.map(([, ...x]) => DESIGNS[name]!(x));
  const size = parameters.length;
  return {
    certified: parameters.map(([value]) => value!),
    standardErrors: parameters.map(([, error]) => error!),
    residualSum: Number(sum),
    degreesOfFreedom: Number(freedom),
    problem: {
      size,
      rows: table.length,
      target: table.map(([y]) => y!),
      lower: new Array<number>(size).fill(-Infinity),
      upper: new Array<number>(size).fill(Infinity),
      predict(theta, into) {
        design.forEach((row, i) => {
          into[i] = row.reduce((total, entry, k) => total + entry * theta[k]!, 0);
        });
      },
      jacobian(_, into) {
        design.forEach((row, i) => {
          row.forEach((entry, k) => {
            into[k * table.length + i] = entry;
          });
        });
      },
    },
  };
}
