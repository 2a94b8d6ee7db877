import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

export interface DemoSignIn {
  role: string;
  name: string;
  email: string;
  password: string;
}

const people = [
  ['owner-operator', 'Odile'],
  ['dispatcher', 'Runa'],
  ['groomer', 'Mika'],
  ['groomer', 'Ines'],
  ['groomer', 'Tobi'],
] as const;

/** The demo's sign-ins: random passwords, kept in a file only its owner reads. */
export function demoSignIns(dataFolder: string): DemoSignIn[] {
  const path = join(dataFolder, 'demo-sign-ins.json');
  if (existsSync(path)) return JSON.parse(readFileSync(path, 'utf8')) as DemoSignIn[];
  const made = people.map(([role, name]) => ({
    role,
    name,
    email: `${name.toLowerCase()}@saltmarsh.example`,
    password: randomBytes(9).toString('base64url'),
  }));
  mkdirSync(dataFolder, { recursive: true });
  writeFileSync(path, JSON.stringify(made, null, 2), { mode: 0o600 });
  return made;
}
