import { inventedStoppingCounts } from './invented-stopping';

/** A file to start from: what it holds is invented and says so on its first line. */
export interface FileTemplate {
  fileName: string;
  text: string;
}

const INVENTED = '# template with invented numbers: replace them with your own';
const IMPLANTED = 100_000;
const ENERGIES_KEV = [2, 4, 6, 8, 10, 12, 14, 18, 22];
const STACK = { meanDepthAt6KeV: 45, binWidthNm: 2, bins: 160, implanted: IMPLANTED };

/** Energy, diamagnetic fraction, σ, note. */
export function scanTemplate(): FileTemplate {
  const rows = ENERGIES_KEV.map((energy) => {
    const fraction = 0.74 - 0.32 / (1 + Math.exp((11 - energy) / 3));
    return `${energy},${fraction.toFixed(3)},0.006,run ${100 + energy}`;
  });
  const about = [
    '# values between 0 and 1; σ is one standard deviation and above 0',
    '# lines that begin with # are comments',
  ];
  return file('scan-template.csv', [
    INVENTED,
    ...about,
    'energy_keV,diamagnetic_fraction,sigma,note',
    ...rows,
  ]);
}

/** Energy, capture rate, σ, note. */
export function rateScanTemplate(): FileTemplate {
  const rows = ENERGIES_KEV.map((energy) => {
    const rate = 4.2 / (1 + Math.exp((11 - energy) / 3));
    return `${energy},${rate.toFixed(3)},0.15,`;
  });
  return file('rate-scan-template.csv', [
    INVENTED,
    'energy_keV,capture_rate_per_us,sigma_per_us,note',
    ...rows,
  ]);
}

/** A depth column and one column of counts per energy; the headings name the energies. */
export function stoppingMatrixTemplate(): FileTemplate {
  const columns = ENERGIES_KEV.map((energyKeV) => inventedStoppingCounts({ ...STACK, energyKeV }));
  const rows = centres().map((depth, bin) =>
    [depth, ...columns.map((counts) => counts[bin])].join(','),
  );
  const heading = ['depth_nm', ...ENERGIES_KEV.map((energy) => `${energy} keV`)].join(',');
  return file('stopping-matrix-template.csv', [INVENTED, implantedLine(), heading, ...rows]);
}

/** Depth and counts of a single energy, which the file name gives. */
export function oneEnergyStoppingTemplate(): FileTemplate {
  const counts = inventedStoppingCounts({ ...STACK, energyKeV: 12 });
  const rows = centres().map((depth, bin) => `${depth}\t${counts[bin]}`);
  return file('stopping-12keV.txt', [INVENTED, implantedLine(), 'depth_nm\tcounts', ...rows]);
}

function centres(): number[] {
  return Array.from({ length: STACK.bins }, (_, bin) => (bin + 0.5) * STACK.binWidthNm);
}

function implantedLine(): string {
  return `# implanted per energy: ${IMPLANTED}`;
}

function file(fileName: string, lines: readonly string[]): FileTemplate {
  return { fileName, text: lines.join('\r\n') + '\r\n' };
}
