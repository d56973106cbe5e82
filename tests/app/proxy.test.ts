import { config, proxy } from '@/proxy';
import { PATH_HEADER } from '@/app/_server/path-header';
import { NextRequest } from 'next/server';
import { afterEach, describe, expect, it, vi } from 'vitest';

const pass = (path: string) => proxy(new NextRequest(`http://desk.example${path}`));
/** What Next hands on to the page. */
const onward = (response: Response, name: string) =>
  response.headers.get(`x-middleware-request-${name}`);

describe('the proxy', () => {
  afterEach(() => vi.unstubAllEnvs());

  it('gives each page a policy with a nonce of its own, to the page and to the browser', () => {
    vi.stubEnv('NODE_ENV', 'production');
    const [first, second] = [pass('/'), pass('/')];
    const policy = first.headers.get('content-security-policy') ?? '';
    expect(policy).toMatch(/script-src 'self' 'nonce-[\w-]{36}' 'strict-dynamic'/);
    expect(policy).toContain("worker-src 'self' blob:");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/unsafe/);
    expect(onward(first, 'content-security-policy')).toBe(policy);
    expect(second.headers.get('content-security-policy')).not.toBe(policy);
  });

  it('tells a page its own address', () => {
    expect(onward(pass('/samples?archived=true'), PATH_HEADER)).toBe('/samples?archived=true');
  });

  it('stays out of the way of uploads, health checks and built files', () => {
    const matches = (path: string) => new RegExp(`^${config.matcher}$`).test(path);
    for (const path of ['/', '/samples', '/fits/new', '/apiary', '/help'])
      expect(matches(path)).toBe(true);
    for (const path of ['/api/scans', '/api/stopping-sets', '/healthz', '/_next/static/x.js'])
      expect(matches(path)).toBe(false);
  });
});
