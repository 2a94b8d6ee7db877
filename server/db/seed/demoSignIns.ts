import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { readOrMakeFile } from '#server/readOrMakeFile.ts';

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
  return JSON.parse(readOrMakeFile(join(dataFolder, 'demo-sign-ins.json'), makeSignIns));
}

function makeSignIns(): string {
  const made = people.map(([role, name]): DemoSignIn => ({
    role,
    name,
    email: `${name.toLowerCase()}@saltmarsh.example`,
    password: randomBytes(9).toString('base64url'),
  }));
  return JSON.stringify(made, null, 2);
}
