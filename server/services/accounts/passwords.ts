import bcrypt from 'bcrypt';
import { env } from '#server/env.ts';

/** Cost 12 takes about a quarter second here; tests use the least bcrypt allows. */
const rounds = env.isTest ? 4 : 12;

export function hashPassword(password: string): Promise<string> {
  return bcrypt.hash(password, rounds);
}

/** Compares against a made-up hash when there is none, so an unknown address takes as long. */
export function passwordFits(password: string, hash: string | null): Promise<boolean> {
  return bcrypt.compare(password, hash ?? nobody).then((fits) => fits && hash !== null);
}

const nobody = bcrypt.hashSync('nobody has this password', rounds);
