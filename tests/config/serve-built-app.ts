import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Seeds a fresh database file, serves the built product on a free loopback port, and ends it by its pid. */
export default async function serveBuiltApp(): Promise<() => Promise<void>> {
  const folder = mkdtempSync(path.join(tmpdir(), 'strandline-browser-'));
  const port = await freePort();
  const env = {
    ...process.env,
    NODE_ENV: 'production' as const,
    NEXT_TELEMETRY_DISABLED: '1',
    DATABASE_URL: `file:${path.join(folder, 'strandline.db')}`,
  };
  execFileSync('npm', ['run', '--silent', 'db:seed'], { env, stdio: 'inherit' });

  const server = spawn(
    process.execPath,
    ['node_modules/next/dist/bin/next', 'start', '-H', '127.0.0.1', '-p', String(port)],
    { env, stdio: ['ignore', 'inherit', 'inherit'] },
  );
  const url = `http://127.0.0.1:${port}`;
  process.env.STRANDLINE_TEST_URL = url;
  process.env.STRANDLINE_TEST_SERVER_PID = String(server.pid);
  await untilReady(`${url}/readyz`, server);

  return async () => {
    await stop(server);
    rmSync(folder, { recursive: true, force: true });
  };
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        typeof address === 'object' && address !== null
          ? resolve(address.port)
          : reject(new Error('No free port.')),
      );
    });
  });
}

async function untilReady(url: string, server: ChildProcess): Promise<void> {
  for (let attempt = 0; attempt < 300; attempt += 1) {
    if (server.exitCode !== null) throw new Error(`The server ended with ${server.exitCode}.`);
    const ready = await fetch(url).then(
      (answer) => answer.ok,
      () => false, // not listening yet
    );
    if (ready) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error('The server was not ready within a minute.');
}

function stop(server: ChildProcess): Promise<void> {
  if (server.exitCode !== null) return Promise.resolve();
  return new Promise((resolve) => {
    server.once('exit', () => resolve());
    server.kill('SIGTERM');
  });
}
