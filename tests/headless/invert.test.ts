import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { HELP } from '@/lib/headless/help';
import type { InvertReport } from '@/lib/headless/report';
import { runCommand } from '@/lib/headless/run-command';
import { fixturePath } from '../support/fixture';

const ROOT = join(import.meta.dirname, '../..');
const SCAN = fixturePath('files/scan.csv');
const STOPPING = fixturePath('files/stopping.csv');
const FILES = ['--scan', SCAN, '--stopping', STOPPING];
const NO_BANDS = ['--resamples', '0'];
/** The edge behind the scans of fixtures/files (fixtures/README.md). */
const TRUE_EDGE_NM = 78.4;

/** The command without a process around it: most of what it does needs none. */
function invert(...args: string[]) {
  const { exitCode, stdout, stderr } = runCommand(args);
  return { status: exitCode, stdout, stderr };
}

/** The command as a process of its own, as a person or a script runs it. */
function spawned(...args: string[]) {
  const command = ['--import', 'tsx', 'lib/headless/invert.ts', ...args];
  const { status, stdout, stderr } = spawnSync(process.execPath, command, {
    cwd: ROOT,
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

function report(...args: string[]): InvertReport {
  const { status, stdout, stderr } = invert(...args, '--json');
  expect([status, stderr]).toEqual([0, '']);
  return JSON.parse(stdout) as InvertReport;
}

function parameter({ parameters }: InvertReport, name: string) {
  const found = parameters.find((one) => one.name === name);
  if (!found) throw new Error(`no parameter ${name}`);
  return found;
}

const valueAt = ({ profile }: InvertReport, depthNm: number) =>
  profile.points.find((point) => point.depthNm >= depthNm)?.value ?? Number.NaN;

describe('a fit of fractions', () => {
  const graded = report(
    ...FILES,
    '--observable',
    'fraction',
    '--response',
    'two-level',
    '--profile',
    'graded',
    '--resamples',
    '60',
  );

  it('prints the promised object and nothing else', () => {
    expect(Object.keys(graded)).toEqual([
      'status',
      'profile',
      'parameters',
      'chiSquare',
      'degreesOfFreedom',
      'pValue',
      'aicc',
      'checks',
    ]);
    expect(Object.keys(graded.profile)).toEqual(['kind', 'points']);
    expect(Object.keys(graded.profile.points[0] ?? {})).toEqual([
      'depthNm',
      'value',
      'lower68',
      'upper68',
      'lower95',
      'upper95',
      'flag',
    ]);
    expect(Object.keys(graded.parameters[0] ?? {})).toEqual([
      'name',
      'value',
      'sigma',
      'interval68',
      'interval95',
      'held',
      'atBound',
    ]);
    expect(Object.keys(graded.checks[0] ?? {})).toEqual(['id', 'state', 'message']);
    expect(graded.parameters.map(({ name }) => name)).toEqual([
      'edgeDepthNm',
      'edgeWidthNm',
      'levelTop',
      'levelBulk',
      'depthScale',
    ]);
    expect(graded.parameters.every(({ atBound }) => atBound === false)).toBe(true);
    expect(graded).toMatchObject({
      status: 'converged',
      profile: { kind: 'graded' },
      degreesOfFreedom: 9,
    });
  });

  it('finds the edge that was put into the scan, inside its 95 % interval', () => {
    const [low, high] = parameter(graded, 'edgeDepthNm').interval95;
    expect(low).toBeLessThan(TRUE_EDGE_NM);
    expect(high).toBeGreaterThan(TRUE_EDGE_NM);
  });

  it('holds the depth scale at 1, or frees it with its prior', () => {
    expect(parameter(graded, 'depthScale')).toMatchObject({ value: 1, sigma: null, held: true });
    const free = report(...FILES, ...NO_BANDS, '--depth-scale', 'free');
    expect(parameter(free, 'depthScale').held).toBe(false);
    expect(parameter(free, 'depthScale').sigma).toBeCloseTo(0.03, 3);
    // One pseudo-observation and one parameter more.
    expect(free.degreesOfFreedom).toBe(graded.degreesOfFreedom);
  });

  it('gives bands around the value wherever there are resamples', () => {
    for (const { lower95, lower68, upper68, upper95 } of graded.profile.points) {
      expect(lower95).toBeLessThanOrEqual(lower68 ?? Number.NaN);
      expect(lower68).toBeLessThanOrEqual(upper68 ?? Number.NaN);
      expect(upper68).toBeLessThanOrEqual(upper95 ?? Number.NaN);
    }
  });

  it('repeats itself by seed', () => {
    const run = (seed: string) =>
      invert(...FILES, '--resamples', '20', '--seed', seed, '--json').stdout;
    const first = run('7');
    expect(run('7') === first).toBe(true);
    const [seven, eight] = [first, run('8')].map((text) => JSON.parse(text) as InvertReport);
    expect(eight?.parameters).toEqual(seven?.parameters);
    expect(eight?.profile.points).not.toEqual(seven?.profile.points);
  });

  it('has no bands without resamples, and two parameters fewer free with a sharp edge', () => {
    const sharp = report(...FILES, ...NO_BANDS, '--profile', 'sharp');
    expect(sharp.profile.kind).toBe('sharp');
    const bands = sharp.profile.points.flatMap(({ lower68, upper68, lower95, upper95 }) => [
      lower68,
      upper68,
      lower95,
      upper95,
    ]);
    expect(new Set(bands)).toEqual(new Set([null]));
    expect(sharp.parameters.map(({ name }) => name)).not.toContain('edgeWidthNm');
    expect(sharp.degreesOfFreedom).toBe(10);
  });

  it('gives the populated share, or a concentration where the bulk is known', () => {
    expect(valueAt(graded, 0)).toBeLessThan(0.01);
    expect(valueAt(graded, 200)).toBeCloseTo(1, 6);
    const bulk = report(...FILES, ...NO_BANDS, '--bulk-concentration', '6.2e15');
    expect(valueAt(bulk, 200)).toBeCloseTo(6.2e15, -9);
  });

  it('turns the share over for an accumulated surface', () => {
    const accumulated = report(...FILES, ...NO_BANDS, '--polarity', 'accumulation');
    expect(valueAt(accumulated, 0)).toBeGreaterThan(0.99);
    expect(parameter(accumulated, 'edgeDepthNm').value).toBeCloseTo(
      parameter(graded, 'edgeDepthNm').value,
      6,
    );
  });

  it('counts depth from below a cap layer', () => {
    const capped = report(...FILES, ...NO_BANDS, '--cap-thickness', '10');
    expect(capped.parameters.map(({ name }) => name)).toContain('levelCap');
    // The same scan with the surface 10 nm deeper; the level of the cap takes some of the freedom.
    expect(
      Math.abs(
        parameter(capped, 'edgeDepthNm').value - (parameter(graded, 'edgeDepthNm').value - 10),
      ),
    ).toBeLessThan(3);
  });
});

describe('files of every kind', () => {
  const plain = invert(...FILES, ...NO_BANDS, '--json').stdout;

  it.each(['scan-decimal-comma.csv', 'scan-blanks.txt', 'scan-bom.csv', 'scan-electronvolts.csv'])(
    '%s gives the same answer',
    (name) => {
      const args = [
        '--scan',
        fixturePath(`files/${name}`),
        '--stopping',
        STOPPING,
        ...NO_BANDS,
        '--json',
      ];
      expect(invert(...args).stdout === plain).toBe(true);
    },
  );

  it('takes one stopping file per energy and interpolates between them', () => {
    const singles = ['2keV.txt', '6.5keV.txt', 'E_10000eV.dat', '14keV.txt', '22keV.txt'].map(
      (name) => fixturePath(`files/single/${name}`),
    );
    const found = report('--stopping', ...singles, '--scan', SCAN, ...NO_BANDS);
    const expected = parameter(JSON.parse(plain) as InvertReport, 'edgeDepthNm');
    // Quantiles between neighbours are near the truth and not the truth: inside the interval of the edge.
    expect(Math.abs(parameter(found, 'edgeDepthNm').value - expected.value)).toBeLessThan(
      expected.sigma ?? 0,
    );
  });

  it('takes the unit of the depths from the heading, or as it is told', () => {
    const angstrom = [
      '--scan',
      SCAN,
      '--stopping',
      fixturePath('files/stopping-angstrom-electronvolts.txt'),
      ...NO_BANDS,
    ];
    const expected = parameter(JSON.parse(plain) as InvertReport, 'edgeDepthNm').value;
    expect(parameter(report(...angstrom), 'edgeDepthNm').value).toBeCloseTo(expected, 3);
    const asNm = parameter(report(...angstrom, '--depth-unit', 'nm'), 'edgeDepthNm').value;
    expect(asNm / expected).toBeCloseTo(10, 2);
  });
});

describe('a fit of capture rates', () => {
  const RATE = [
    '--scan',
    fixturePath('files/scan-rate.csv'),
    '--stopping',
    STOPPING,
    '--observable',
    'rate',
    ...NO_BANDS,
  ];

  it('gives a concentration by the capture coefficient', () => {
    const found = report(...RATE, '--response', 'capture-rate', '--gamma', '1e-6');
    // 4 µs⁻¹ at 10⁻⁶ cm³/s is 4·10¹² cm⁻³; σ of the level is about 0.1 µs⁻¹.
    expect(Math.abs(valueAt(found, 250) / 1e12 - 4)).toBeLessThan(0.5);
    expect(valueAt(found, 250)).toBeCloseTo(parameter(found, 'levelBulk').value * 1e12, -3);
    const [low, high] = parameter(found, 'edgeDepthNm').interval95;
    expect([(low ?? 0) < TRUE_EDGE_NM, (high ?? 999) > TRUE_EDGE_NM]).toEqual([true, true]);
  });

  it('needs that coefficient, and the response that goes with it', () => {
    expect(invert(...RATE)).toEqual({
      status: 2,
      stdout: '',
      stderr: '--gamma: the capture-rate response needs the capture coefficient in cm³/s.\n',
    });
    expect(invert(...RATE, '--response', 'two-level').stderr).toBe(
      '--response: a rate goes with capture-rate, not with two-level.\n',
    );
  });
});

describe('bad input', () => {
  const scan = (name: string) => [
    '--scan',
    fixturePath(`bad/${name}`),
    '--stopping',
    STOPPING,
    ...NO_BANDS,
    '--json',
  ];
  const stopping = (name: string) => [
    '--scan',
    SCAN,
    '--stopping',
    fixturePath(`bad/${name}`),
    ...NO_BANDS,
    '--json',
  ];

  it.each([
    [
      scan('nan.csv'),
      'nan.csv, line 4, column 2: expected a finite number for the fraction, found "NaN".',
    ],
    [
      scan('zero-sigma.csv'),
      'zero-sigma.csv, line 4, column 3: expected σ greater than 0, found 0.',
    ],
    [
      scan('duplicate-energy.csv'),
      'duplicate-energy.csv, line 4, column 1: expected each energy once, found 4 keV again; it already stands on line 3.',
    ],
    [
      scan('two-columns.csv'),
      'two-columns.csv, line 1: expected three columns of numbers (energy, value, σ), found 2.',
    ],
    [scan('empty.csv'), 'empty.csv: the file is empty.'],
    [
      scan('picture.csv'),
      'picture.csv: the file is binary, not text; expected a table of numbers.',
    ],
    [
      scan('energy-outside.csv'),
      'energy-outside.csv, line 8: The scan has a point at 30 keV, but the stopping set reaches only from 2 to 22 keV; stopping profiles are never extrapolated.',
    ],
    [
      stopping('stopping-out-of-order.csv'),
      'stopping-out-of-order.csv, line 4, column 1: expected depths in ascending order, found 2 after 3.',
    ],
    [
      stopping('stopping-no-header.txt'),
      'stopping-no-header.txt, line 1: expected a header with the energy of each column (such as “2 keV”); a matrix without one does not say its energies.',
    ],
  ])('%#', (args, sentence) => {
    expect(invert(...args)).toEqual({ status: 2, stdout: '', stderr: `${sentence}\n` });
  });

  it('fewer points than parameters', () => {
    const { status, stdout, stderr } = invert(...scan('two-points.csv'));
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toMatch(/^two-points\.csv: .*2 points.*parameters.*\.\n$/);
  });

  it('a file that is too large, and one that is not there', () => {
    const folder = mkdtempSync(join(tmpdir(), 'strandline-'));
    try {
      const large = join(folder, 'large.csv');
      writeFileSync(large, Buffer.alloc(6 * 1024 * 1024, '1'));
      expect(invert('--scan', large, '--stopping', STOPPING)).toEqual({
        status: 2,
        stdout: '',
        stderr: 'large.csv: the file has 6 MB; the limit is 5 MB.\n',
      });
    } finally {
      rmSync(folder, { recursive: true });
    }
    const missing = invert('--scan', 'no-such.csv', '--stopping', STOPPING);
    expect(missing.status).toBe(2);
    expect(missing.stderr).toMatch(/^no-such\.csv: the file cannot be read \(ENOENT.*\)\.\n$/);
  });

  it('names the first ten faults and counts the rest', () => {
    const folder = mkdtempSync(join(tmpdir(), 'strandline-'));
    try {
      const bad = join(folder, 'bad.csv');
      writeFileSync(bad, Array.from({ length: 14 }, (_, index) => `${index + 1},0.5,0`).join('\n'));
      const lines = invert('--scan', bad, '--stopping', STOPPING).stderr.trimEnd().split('\n');
      expect(lines).toHaveLength(11);
      expect(lines[10]).toBe('… and 4 more.');
    } finally {
      rmSync(folder, { recursive: true });
    }
  });

  it.each([
    [['--stopping', STOPPING], '--scan: name the file of the energy scan.'],
    [['--scan', SCAN], '--stopping: name the file or files of the stopping profiles.'],
    [[...FILES, '--profile', 'round'], '--profile: expected sharp or graded, found "round".'],
    [[...FILES, '--resamples', '-1'], /resamples/],
    [
      [...FILES, '--resamples', '10001'],
      '--resamples: expected a whole number from 0 to 10000, found "10001".',
    ],
    [
      [...FILES, '--seed', '1.5'],
      '--seed: expected a whole number from 0 to 4294967295, found "1.5".',
    ],
    [[...FILES, '--gamma', '0'], '--gamma: expected a number above 0, found "0".'],
    [
      [...FILES, '--cap-thickness', 'thin'],
      '--cap-thickness: expected a number of 0 or more, found "thin".',
    ],
    [[...FILES, '--fast'], /^Unknown option '--fast'/],
    [[SCAN, ...FILES], `"${SCAN}": an option such as --scan or --stopping must come before it.`],
  ])('option %#', (args, sentence) => {
    const { status, stdout, stderr } = invert(...args);
    expect([status, stdout]).toEqual([2, '']);
    if (typeof sentence === 'string') expect(stderr).toBe(`${sentence}\n`);
    else expect(stderr).toMatch(sentence);
  });
});

describe('as a process', () => {
  it('prints the same answer, byte for byte, and ends with 0', () => {
    const args = [...FILES, '--resamples', '20', '--json'];
    const { status, stdout, stderr } = spawned(...args);
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout === invert(...args).stdout).toBe(true);
  });

  it('ends with 2 on bad input, and says nothing on stdout', () => {
    const args = ['--scan', fixturePath('bad/nan.csv'), '--stopping', STOPPING, '--json'];
    const found = spawned(...args);
    expect(found).toEqual({ ...invert(...args), status: 2, stdout: '' });
    expect(found.stderr).toContain('nan.csv, line 4, column 2:');
  });

  it('ends with 3 without a usable minimum', () => {
    const args = ['--scan', fixturePath('files/scan-flat.csv'), '--stopping', STOPPING, '--json'];
    expect(spawned(...args)).toEqual({ ...invert(...args), status: 3, stdout: '' });
  });
});

describe('the rest', () => {
  it('ends with 3 where the scan says nothing of an edge', () => {
    const { status, stdout, stderr } = invert(
      '--scan',
      fixturePath('files/scan-flat.csv'),
      '--stopping',
      STOPPING,
      '--json',
    );
    expect([status, stdout]).toEqual([3, '']);
    expect(stderr).toMatch(/^The scan does not say where the edge is.*\.\n$/);
  });

  it('prints a table without --json', () => {
    const { status, stdout } = invert(...FILES, ...NO_BANDS);
    expect(status).toBe(0);
    expect(stdout).toMatch(/^graded edge, converged\n/);
    expect(stdout).toMatch(/edge depth +\d+\.\d \+\d\.\d −\d\.\d nm/);
    expect(stdout).toContain('1.000 (held)');
    expect(stdout).toMatch(/χ² +[\d.]+ for 9 degrees of freedom/);
  });

  it('explains itself', () => {
    expect(invert('--help')).toEqual({ status: 0, stdout: HELP, stderr: '' });
  });
});
