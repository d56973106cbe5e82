import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { nistProblem } from './support/nist';
import { libraryAlone, solveLinear, solveNonlinear, type Digits } from './support/nist-digits';

/** Half a digit: what another order of rounding may cost; the table itself is rounded to a tenth. */
const SLACK = 0.5;

const text = readFileSync('fixtures/nist/DIGITS.md', 'utf8');
const rows = [...text.matchAll(/^\| ([A-Z]\S+) \| (.+) \|$/gm)].map(
  ([, name, cells]) => [name!, cells!.split(' | ').map(Number)] as const,
);
const nonlinear = rows.flatMap(([name, [start, ...digits]]) =>
  digits.length === 5 ? [{ name, start: start!, digits }] : [],
);
const linear = rows.filter(([, digits]) => digits.length === 3);

function expectReached({ values, errors, residualSum }: Digits, stated: number[], what: string) {
  [values, errors, residualSum].forEach((found, column) => {
    expect(found, `${what}, column ${column + 1}`).toBeGreaterThanOrEqual(stated[column]! - SLACK);
  });
}

/** The table is compared with what it is a table of, so that it cannot go stale. */
describe('the table of digits', () => {
  it('has every problem', () => {
    expect(nonlinear).toHaveLength(54);
    expect(linear).toHaveLength(11);
  });

  it('is reached by the solver', () => {
    for (const { name, start, digits } of nonlinear)
      expectReached(solveNonlinear(name, start === 1 ? 0 : 1), digits, `${name} ${start}`);
    for (const [name, digits] of linear) expectReached(solveLinear(name), digits, name);
  });

  // The large problems take half a minute by the library alone; a slip of the settings would show in the small ones.
  it('says of the library alone what it does', () => {
    const small = nonlinear.filter(({ name }) => nistProblem(name).problem.rows <= 14);
    expect(small.length).toBeGreaterThanOrEqual(14);
    for (const { name, start, digits } of small) {
      const index = start === 1 ? 0 : 1;
      const found = [libraryAlone(name, index, 'defaults'), libraryAlone(name, index, 'best')];
      found.forEach((value, column) => {
        expect(Math.abs(value - digits[3 + column]!), `${name} ${start}`).toBeLessThan(SLACK);
      });
    }
  });

  it('counts in words what it shows in figures', () => {
    const counts = [3, 4, 0].map((column) =>
      [1, 2].map(
        (start) =>
          nonlinear.filter((row) => row.start === start && row.digits[column]! >= 6).length,
      ),
    );
    const words = [...text.matchAll(/(\d+) of 27 from start 1 and (\d+) of 27 from start 2/g)];
    expect(words.map(([, first, second]) => [Number(first), Number(second)])).toEqual(counts);
  });
});
