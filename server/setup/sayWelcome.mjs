import { say } from './say.mjs';

/**
 * Prints where Furlong runs and how to get in.
 * @param {string} url
 * @param {import('./startMode.mjs').StartMode} mode
 * @param {import('./seedLine.mjs').SignIn[]} signIns
 */
export function sayWelcome(url, mode, signIns) {
  say(`\nFurlong is ready: ${url}\n`);
  if (signIns.length > 0) {
    say('Demo sign-ins (for this machine only; nothing is really texted or mailed):');
    const width = (/** @type {'role' | 'email'} */ key) =>
      Math.max(...signIns.map((signIn) => signIn[key].length));
    for (const { role, email, password } of signIns) {
      say(`  ${role.padEnd(width('role'))}  ${email.padEnd(width('email'))}  ${password}`);
    }
  } else if (mode.noDemoBecause) {
    say(`No demo business and no fake phones: ${mode.noDemoBecause}. Sign up on the first page.`);
  }
  say('\nCtrl-C stops it.');
}
