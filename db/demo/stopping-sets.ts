import { inventedStoppingCounts } from '@/lib/files/invented-stopping';
import type { DemoFile, DemoStoppingSet } from './types';

/** The ladder of implantation energies that the demo's profiles are computed for. */
export const LADDER_KEV = [2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22] as const;
const BINS = 320;
const BIN_WIDTH_NM = 1;
const IMPLANTED = 200_000;
const INVENTED = '# invented numbers of the demo team';

/** Two stacks: one comes as a matrix, the other as a file for each energy. */
export function demoStoppingSets(): DemoStoppingSet[] {
  return [
    {
      key: 'carbide',
      meta: {
        name: 'SiC under 25 nm oxide, 1 nm bins',
        layerStack: '25 nm SiO2 (2.2 g/cm³) on 4H-SiC (3.21 g/cm³)',
        ...INVENTED_ORIGIN,
      },
      files: [matrixFile('sic-oxide-25nm.csv', 40)],
      reading: readingOf([{ delimiter: 'comma' }]),
      invented: true,
    },
    {
      key: 'germanium',
      meta: {
        name: 'Ge under 4 nm alumina, 1 nm bins',
        layerStack: '4 nm Al2O3 (3.0 g/cm³) on Ge (5.32 g/cm³)',
        ...INVENTED_ORIGIN,
      },
      files: LADDER_KEV.map((energyKeV) => oneEnergyFile(energyKeV, 45)),
      reading: readingOf(LADDER_KEV.map(() => ({ delimiter: 'tab' }))),
      invented: true,
    },
  ];
}

const INVENTED_ORIGIN = {
  origin: 'Formula of the demo generator; no stopping calculation',
  notes:
    'Invented profiles of the right shape: density as x·exp(−(x/x₀)²), mean depth growing as the energy to the power 0.75.',
};

function readingOf(files: readonly { delimiter: 'comma' | 'tab' }[]): DemoStoppingSet['reading'] {
  return {
    depthUnit: 'nm',
    positionsAre: 'centres',
    weightsAre: 'counts',
    implantedPerEnergy: IMPLANTED,
    files: files.map(({ delimiter }) => ({
      delimiter,
      decimal: 'point',
      energyKeV: null,
      skipLines: [],
    })),
  };
}

function countsOf(energyKeV: number, meanDepthAt6KeV: number): number[] {
  return inventedStoppingCounts({
    energyKeV,
    meanDepthAt6KeV,
    binWidthNm: BIN_WIDTH_NM,
    bins: BINS,
    implanted: IMPLANTED,
  });
}

const CENTRES_NM = Array.from({ length: BINS }, (_, bin) => (bin + 0.5) * BIN_WIDTH_NM);

function matrixFile(fileName: string, meanDepthAt6KeV: number): DemoFile {
  const columns = LADDER_KEV.map((energyKeV) => countsOf(energyKeV, meanDepthAt6KeV));
  const rows = CENTRES_NM.map((depth, bin) =>
    [depth, ...columns.map((counts) => counts[bin])].join(','),
  );
  const heading = ['depth_nm', ...LADDER_KEV.map((energy) => `${energy} keV`)].join(',');
  return { fileName, text: lines([INVENTED, implanted(), heading, ...rows]) };
}

function oneEnergyFile(energyKeV: number, meanDepthAt6KeV: number): DemoFile {
  const rows = countsOf(energyKeV, meanDepthAt6KeV).map(
    (count, bin) => `${CENTRES_NM[bin]}\t${count}`,
  );
  return {
    fileName: `ge-alumina-${energyKeV}keV.txt`,
    text: lines([INVENTED, implanted(), 'depth_nm\tcounts', ...rows]),
  };
}

function implanted(): string {
  return `# implanted per energy: ${IMPLANTED}`;
}

function lines(all: readonly string[]): string {
  return all.join('\n') + '\n';
}
