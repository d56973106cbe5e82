import {
  oneEnergyStoppingTemplate,
  rateScanTemplate,
  scanTemplate,
  stoppingMatrixTemplate,
} from '@/lib/files/templates';

/** The files that the help page offers, by their names. */
export const TEMPLATES = [
  { ...scanTemplate(), about: 'energy scan of diamagnetic fractions' },
  { ...rateScanTemplate(), about: 'energy scan of capture rates' },
  { ...stoppingMatrixTemplate(), about: 'stopping profiles of all energies in one matrix' },
  {
    ...oneEnergyStoppingTemplate(),
    about: 'stopping profile of one energy, named in the file name',
  },
];
