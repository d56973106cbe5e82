/** JSON from an own address, for SWR; a refusal throws with the server's sentence. */
export async function fetchJson(path: string): Promise<unknown> {
  const response = await fetch(path);
  const answer: unknown = await response.json().catch(() => null);
  if (!response.ok)
    throw new Error(sentenceOf(answer) ?? `The server answered with status ${response.status}.`);
  return answer;
}

function sentenceOf(answer: unknown): string | null {
  if (typeof answer !== 'object' || answer === null || !('error' in answer)) return null;
  const { error } = answer;
  if (typeof error !== 'object' || error === null || !('message' in error)) return null;
  return typeof error.message === 'string' ? error.message : null;
}
