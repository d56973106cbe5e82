/** Builds the product, seeds the demo team and serves it on port 3000. Ctrl+C ends it. */
import { execFileSync, spawn } from 'node:child_process';

const port = process.env.PORT ?? '3000';
const env = { ...process.env, NEXT_TELEMETRY_DISABLED: '1', NODE_ENV: 'production' };
const next = ['node_modules/next/dist/bin/next'];

execFileSync(process.execPath, [...next, 'build'], { stdio: 'inherit', env });
const signIns = execFileSync('npm', ['run', '--silent', 'db:seed'], {
  encoding: 'utf8',
  env,
  stdio: ['ignore', 'pipe', 'inherit'],
});

const server = spawn(process.execPath, [...next, 'start', '-p', port], { stdio: 'inherit', env });
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code) => process.exit(code ?? 0));

await untilReady();
console.log(`\nStrandline is at http://localhost:${port}\n\n${signIns.trim()}\n\nCtrl+C ends it.`);

async function untilReady() {
  for (let attempt = 0; attempt < 300; attempt += 1) {
    const ready = await fetch(`http://127.0.0.1:${port}/readyz`).then(
      (answer) => answer.ok,
      () => false, // not listening yet
    );
    if (ready) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  console.error('The server did not become ready within a minute.');
  server.kill('SIGTERM');
  process.exit(1);
}
