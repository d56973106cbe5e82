import { PATH_HEADER } from '@/app/_server/path-header';
import { NextResponse, type NextRequest } from 'next/server';

/** Tells pages their own address, and gives each its content security policy. */
export function proxy(request: NextRequest): NextResponse {
  const headers = new Headers(request.headers);
  headers.set(PATH_HEADER, request.nextUrl.pathname + request.nextUrl.search);
  // Next reads the nonce out of the policy on the request and puts it on its own scripts.
  const policy = process.env.NODE_ENV === 'production' ? policyWith(crypto.randomUUID()) : null;
  if (policy !== null) headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  if (policy !== null) response.headers.set('content-security-policy', policy);
  response.headers.set('x-content-type-options', 'nosniff');
  response.headers.set('referrer-policy', 'same-origin');
  response.headers.set('permissions-policy', 'camera=(), microphone=(), geolocation=()');
  response.headers.set('cross-origin-opener-policy', 'same-origin');
  return response;
}

/** Only in production: development evaluates code and writes styles of its own. */
function policyWith(nonce: string): string {
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'`,
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/** Pages only: bodies that pass a proxy are cut at 10 MB, so uploads go round it. */
export const config = {
  matcher: '/((?!api/|_next/static|_next/image|healthz|readyz|icon\\.svg|favicon\\.ico).*)',
};
