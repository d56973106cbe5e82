import { execFileSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { chromium } from '@playwright/test';

const DEBIAN_CHROMIUM = '/usr/bin/chromium';

/** Flags that keep Chromium from talking to anything but the page under test. */
export const CHROMIUM_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Path of the Chromium to use: Debian's where there is one, else the one Playwright brought; null when neither is there. */
export function findChromium() {
  if (existsSync(DEBIAN_CHROMIUM)) return DEBIAN_CHROMIUM;
  const own = chromium.executablePath();
  return own && existsSync(own) ? own : null;
}

/** Installs Debian's Chromium where apt is at hand and we are root; elsewhere says what to do. */
export function ensureChromium() {
  if (findChromium()) return;
  const canInstall = existsSync('/usr/bin/apt-get') && process.getuid?.() === 0;
  if (!canInstall) {
    throw new Error(
      'The browser tests need Chromium. Install it with your system’s packages, or run: npx playwright install chromium',
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  execFileSync('apt-get', ['update', '-qq'], { stdio: 'inherit', env });
  execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], {
    stdio: 'inherit',
    env,
  });
}
