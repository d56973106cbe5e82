const HOUR_MS = 3_600_000;

/** How long something has waited, in whole units: "under an hour", "5 hours", "3 days". */
export function waitingWords(sinceIso: string, now: Date): string {
  const hours = Math.floor((now.getTime() - Date.parse(sinceIso)) / HOUR_MS);
  if (hours < 1) return 'under an hour';
  if (hours < 48) return hours === 1 ? '1 hour' : `${hours} hours`;
  return `${Math.floor(hours / 24)} days`;
}
