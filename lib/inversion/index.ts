/** Public door of the inversion library: everything outside imports from here. */
export * from './types';
export * from './constants';
export { InversionError } from './errors';
export {
  createStoppingProfile,
  type StoppingProfileTable,
} from './stopping/create-stopping-profile';
export { createStoppingSet } from './stopping/create-stopping-set';
export { stoppingProfileAt } from './stopping/stopping-profile-at';
export { stoppingMoments, type StoppingMoments } from './stopping/stopping-moments';
export { stoppingQuantile } from './stopping/stopping-quantile';
export { cumulativeStopping } from './stopping/cumulative-stopping';
export { prepareFit } from './fit/prepare-fit';
export type { PreparedFit } from './fit/prepared-fit';
export { fit, type FitOptions, type FitOutcome } from './fit/fit';
export { valuesOf } from './fit/theta-of';
export { foldScan } from './fold/fold-scan';
export { foldCurve } from './fold/fold-curve';
export { carrierProfile } from './profile/carrier-profile';
export { defaultDepthGrid } from './profile/default-depth-grid';
export { resample, type ResampleBlock } from './uncertainty/resample';
export { bootstrapBands } from './uncertainty/bootstrap-bands';
export type { Bands } from './uncertainty/bands';
export { depthInformation } from './uncertainty/depth-information';
export { edgeInformationByEnergy } from './uncertainty/edge-information-by-energy';
export { runChecks } from './checks/run-checks';
export { compareFits, type Comparison, type ComparisonRow } from './compare/compare-fits';
export { zeroWidthTest, type ZeroWidthTest } from './compare/zero-width-test';
export { simulateScan, type Simulation } from './simulate/simulate-scan';
