import { AppError } from '@/lib/errors';

/**
 * Route handlers check no origin by themselves. Browsers say where a request comes from in
 * Sec-Fetch-Site, older ones in Origin; a request with neither comes from no browser and carries
 * no cookie that a page could have borrowed.
 */
export function refuseForeignOrigin(request: Request, ownOrigin?: string): void {
  const site = request.headers.get('sec-fetch-site');
  if (site !== null) {
    if (site === 'same-origin' || site === 'none') return;
    throw foreign();
  }
  const origin = request.headers.get('origin');
  if (origin === null) return;
  const own = ownOrigin === undefined ? hostOf(request) : new URL(ownOrigin).host;
  if (!URL.canParse(origin) || new URL(origin).host !== own) throw foreign();
}

function hostOf(request: Request): string {
  return request.headers.get('host') ?? new URL(request.url).host;
}

function foreign(): AppError {
  return new AppError('forbidden', 'This request came from another site and was not carried out.');
}
