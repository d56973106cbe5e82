/** The process runs. */
export function GET(): Response {
  return Response.json({ status: 'fine' }, { headers: { 'cache-control': 'no-store' } });
}
