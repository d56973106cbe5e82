import type { ScanColumns, ScanReadOptions } from '@/lib/files/scan-file';
import type { StoppingReadOptions } from '@/lib/files/stopping-file';
import type {
  CarrierScale,
  Observable,
  ParameterName,
  ParameterSetting,
  Polarity,
  ProfileKind,
  Response,
} from '@/lib/inversion/index';

/**
 * What the demo generator hands to the seed: plain data, no ids. Things refer to each other by
 * `key`. Every number comes from a formula and the seed, and everything carries `invented: true`.
 */
export interface DemoData {
  seed: number;
  invented: true;
  team: { name: string; invented: true };
  people: readonly DemoPerson[];
  samples: readonly DemoSample[];
  stoppingSets: readonly DemoStoppingSet[];
  scans: readonly DemoScan[];
  /** In the order in which they must be saved: a fit stands after the one that it came from. */
  fits: readonly DemoFit[];
}

export interface DemoPerson {
  key: string;
  name: string;
  email: string;
  role: 'owner' | 'analyst' | 'reviewer' | 'modeller';
  invented: true;
}

/** A file exactly as a person would have uploaded it: UTF-8 text, to be stored byte for byte. */
export interface DemoFile {
  fileName: string;
  text: string;
}

export interface DemoSample {
  key: string;
  name: string;
  material: string;
  /** n: electrons, p: holes. */
  carrierType: 'n' | 'p';
  dopingPerCm3: number;
  dopingSigmaPerCm3: number;
  capMaterial: string;
  capThicknessNm: number;
  treatment: string;
  notes: string;
  invented: true;
}

export interface DemoStoppingSet {
  key: string;
  name: string;
  layerStack: string;
  capThicknessNm: number;
  files: readonly DemoFile[];
  /** Options with which lib/files/stopping-file reads `files` without a problem. */
  readAs: StoppingReadOptions;
  notes: string;
  invented: true;
}

export type DemoIllumination = 'dark' | 'ultraviolet lamp' | 'after lamp';

export interface DemoScan {
  key: string;
  sampleKey: string;
  name: string;
  observable: Observable;
  temperatureK: number;
  fieldMillitesla: number;
  illumination: DemoIllumination;
  gateBiasV: number | null;
  /** Calendar day, YYYY-MM-DD. */
  measuredOn: string;
  file: DemoFile;
  /** Columns and options with which lib/files/scan-file reads `file` without a problem. */
  readAs: { columns: ScanColumns; options: ScanReadOptions };
  notes: string;
  invented: true;
}

/** Where a comment points; `fit` is the whole of it. */
export type DemoAnchor =
  | { kind: 'fit' }
  | { kind: 'point'; energyKeV: number }
  | { kind: 'depth'; depthNm: number }
  | { kind: 'check'; checkId: string };

export interface DemoComment {
  byKey: string;
  text: string;
  anchor: DemoAnchor;
}

export interface DemoFit {
  key: string;
  name: string;
  scanKey: string;
  stoppingKey: string;
  authorKey: string;
  /** The fit that this one was made from; null for a first one. */
  fromFitKey: string | null;
  profile: ProfileKind;
  polarity: Polarity;
  response: Response;
  carriers: CarrierScale;
  capThicknessNm: number;
  parameters: Partial<Record<ParameterName, ParameterSetting>>;
  /** Energies (keV) of points that are switched off. */
  switchedOffKeV: readonly number[];
  resamples: number;
  resampleSeed: number;
  outcome: 'draft' | 'submitted' | 'accepted' | 'returned';
  comments: readonly DemoComment[];
  /** Who decided and why; null for a draft or a fit still in review. */
  decision: { byKey: string; reason: string } | null;
  invented: true;
}
