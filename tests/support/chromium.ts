import { chromium as playwright, type Browser } from 'playwright-core';
import { findProgram } from '#server/setup/findProgram.mjs';

/**
 * Starts Debian's Chromium, unseen. Throws when there is none, saying how to get it; `npm test`
 * installs it by itself. The caller closes it.
 */
export function launchChromium(): Promise<Browser> {
  return playwright.launch({ executablePath: chromiumPath(), args: chromiumArguments() });
}

/** Where the browser is, for a test that starts it in its own way (a profile that persists). */
export function chromiumPath(): string {
  const found = findProgram('chromium', 'chromium-browser');
  if (!found) throw new Error('No chromium: npm test installs it, or apt-get install chromium.');
  return found;
}

/** What Chromium needs to run as root and in a small /dev/shm (containers, chroots). */
export function chromiumArguments(): string[] {
  // Chromium's sandbox refuses root. The pages it opens here are our own.
  const asRoot = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  return [
    ...asRoot,
    '--disable-dev-shm-usage',
    '--disable-gpu',
    // Tests talk to our own server only: no start page, no updates, no guesses at other hosts.
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    // The same pixels whatever the machine: for screens that are looked at.
    '--force-color-profile=srgb',
    '--font-render-hinting=none',
  ];
}
