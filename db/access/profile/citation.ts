import type { IssuedProfileRow } from '@/lib/schemas/profile';

/** How the profile is named in a report: who, what, under which number, when. */
export function citationOf(row: IssuedProfileRow, teamName: string): string {
  const day = row.issuedAt.slice(0, 10);
  const what = `carrier profile of ${row.sampleName} (${row.material}), ${row.scanName}`;
  const invented = row.invented ? ' Invented data.' : '';
  return `${row.fittedBy}, ${what}. ${teamName}, issued profile ${row.number}, ${day}.${invented}`;
}
