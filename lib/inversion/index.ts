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
export type { Estimate } from './electrostatics/estimate';
export {
  checkSemiconductor,
  type Semiconductor,
  type Sourced,
} from './electrostatics/semiconductor';
export { MATERIALS, type MaterialName } from './electrostatics/materials';
export { gapEv } from './electrostatics/gap';
export {
  intrinsicConcentration,
  type IntrinsicConcentration,
} from './electrostatics/intrinsic-concentration';
export { bulkCarriers } from './electrostatics/bulk-carriers';
export { fermiPotential, type FermiPotentialInput } from './electrostatics/fermi-potential';
export { debyeLengthNm, type DebyeLengthInput } from './electrostatics/debye-length';
export { depletionWidthNm, type DepletionWidthInput } from './electrostatics/depletion-width';
export { maximumDepletionWidthNm } from './electrostatics/maximum-depletion-width';
export {
  edgeElectrostatics,
  type EdgeElectrostatics,
  type EdgeElectrostaticsInput,
} from './electrostatics/edge-electrostatics';
export { surfaceRegime, type SurfaceRegime } from './electrostatics/surface-regime';
export { surfaceCharge, type SurfaceCharge } from './electrostatics/surface-charge';
export type { BandBendingInput } from './electrostatics/band-bending-input';
export { bandBendingProfile, type BandBendingProfile } from './electrostatics/band-bending-profile';
export { HYPERFINE_MHZ } from './charge-cycle/muon-constants';
export { breitRabiLines, diamagneticMHz, type MuoniumLine } from './charge-cycle/muonium-lines';
export { fitTemperatureScans } from './charge-cycle/joint-fit';
export type {
  JointFitAnswer,
  JointFitOptions,
  JointFitOutcome,
  JointParameter,
  JointParameterName,
  JointResidual,
} from './charge-cycle/joint-fit-answer';
export type {
  JointFitInput,
  TemperaturePoint,
  TemperatureScan,
} from './charge-cycle/joint-fit-input';
export {
  captureRateScan,
  type CaptureRateScan,
  type CaptureRateScanOutcome,
} from './charge-cycle/capture-rate-scan';
export {
  simulateTemperatureScans,
  type TemperatureScanTruth,
} from './charge-cycle/simulate-temperature-scans';
export {
  bootstrapLikelihoodRatio,
  likelihoodRatioTest,
  type LikelihoodRatioTest,
} from './compare/bootstrap-likelihood-ratio';
export type { FittedModel, NestedFits } from './compare/nested-fits';
export {
  smallestWidthFromSharp,
  type SmallestWidth,
  type WidthPower,
} from './compare/smallest-width';
export {
  bestNextEnergy,
  type NextEnergy,
  type NextEnergyInput,
  type NextEnergyOutcome,
} from './planning/best-next-energy';
export {
  bestSplit,
  type EnergyHours,
  type OptimalPlan,
  type Plan,
  type SplitInput,
  type SplitOutcome,
} from './planning/best-split';
export {
  oneHourSigmaAt,
  oneHourSigmas,
  type EnergySigma,
  type OneHourSigma,
} from './planning/one-hour-sigma';
export {
  injectAndRecover,
  type Injection,
  type RecoveredParameter,
  type RecoveredScan,
} from './simulate/inject-and-recover';
export {
  recoveryReport,
  type Coverage,
  type ParameterRecovery,
  type RecoveryReport,
} from './simulate/recovery-report';
export type { SeededBlock } from './simulate/check-block';
export type { FreeFormInput, Monotonic } from './free-form/free-form-input';
export { prepareFreeForm, type PreparedFreeForm } from './free-form/prepare-free-form';
export {
  freeFormAt,
  solveFreeForm,
  type FreeFormAnswer,
  type FreeFormOptions,
  type FreeFormSolution,
  type StrengthRule,
} from './free-form/solve-free-form';
export {
  createPenalisedWork,
  solveAtStrength,
  type ColumnMatrix,
  type CurvePoint,
  type PenalisedProblem,
  type PenalisedWork,
} from './free-form/penalised';
export { differenceOperator } from './free-form/differences';
export { strengthCurve, strengthGrid } from './free-form/strength-curve';
export {
  chooseStrength,
  type StrengthChoice,
  type StrengthChoices,
} from './free-form/choose-strength';
export { resolutionMatrix, type Resolution } from './free-form/resolution';
export { resampleFreeForm } from './free-form/resample-free-form';
export { freeFormBands, type FreeFormBands } from './free-form/free-form-bands';
export {
  freeFormDepths,
  freeFormProfile,
  type FreeFormPoint,
  type FreeFormProfile,
} from './free-form/free-form-profile';
export { sensitivityAt } from './fit/sensitivity';
export { farEdgeDepth } from './uncertainty/far-edge-depth';
export {
  captureCoefficient,
  thermalVelocity,
  type CaptureCoefficientInput,
} from './response/capture-coefficient';
export {
  calibrationErrors,
  type CalibrationError,
  type MovedCalibration,
} from './uncertainty/calibration-errors';
