import type { Role } from '@/lib/schemas/common';
import type { FitSpec } from '@/lib/schemas/fit';
import type { SampleInput } from '@/lib/schemas/sample';
import type { ScanMeta, ScanReading } from '@/lib/schemas/scan';
import type { StoppingMeta, StoppingReading } from '@/lib/schemas/stopping-set';

/**
 * What the demo generator hands to the seed: plain data in the shapes that the verbs take, without
 * ids. Things refer to each other by `key`. Every number comes from a formula and the seed, and
 * everything carries `invented: true`.
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
  role: Role;
  invented: true;
}

/** A file exactly as a person would have uploaded it: UTF-8 text, to be stored byte for byte. */
export interface DemoFile {
  fileName: string;
  text: string;
}

export interface DemoSample {
  key: string;
  input: SampleInput;
  invented: true;
}

export interface DemoStoppingSet {
  key: string;
  meta: StoppingMeta;
  /** In the order of `reading.files`. */
  files: readonly DemoFile[];
  reading: StoppingReading;
  invented: true;
}

export interface DemoScan {
  key: string;
  sampleKey: string;
  meta: ScanMeta;
  file: DemoFile;
  reading: ScanReading;
  invented: true;
}

/** One step in the history of a fit, in order. A return carries its reason, a comment may point at something. */
export interface DemoReviewEvent {
  kind: 'submitted' | 'comment' | 'accepted' | 'returned';
  byKey: string;
  body: string;
  /** Such as "point 14 keV", "depth 80 nm" or "check runs-test"; empty for the whole fit. */
  target: string;
}

export interface DemoFit {
  key: string;
  name: string;
  notes: string;
  scanKey: string;
  stoppingKey: string;
  authorKey: string;
  /** The fit that this one was made from; null for a first one. */
  parentKey: string | null;
  spec: FitSpec;
  outcome: 'draft' | 'submitted' | 'accepted' | 'returned';
  events: readonly DemoReviewEvent[];
  invented: true;
}
