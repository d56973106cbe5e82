const BROWSERS: readonly [RegExp, string][] = [
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/Firefox\//, 'Firefox'],
  [/Chrome\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];
const SYSTEMS: readonly [RegExp, string][] = [
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'macOS'],
  [/Linux/, 'Linux'],
];

/** A label that a person recognises in the list of sessions, such as "Firefox on Linux". */
export function deviceName(userAgent: string): string {
  const browser = BROWSERS.find(([mark]) => mark.test(userAgent))?.[1] ?? 'A browser';
  const system = SYSTEMS.find(([mark]) => mark.test(userAgent))?.[1];
  return system === undefined ? browser : `${browser} on ${system}`;
}
