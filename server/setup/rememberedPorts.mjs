import fs from 'node:fs';
import path from 'node:path';
import { dataFolder } from './projectRoot.mjs';

const file = path.join(dataFolder, 'ports.json');

/**
 * The ports of the last start, tried first so that a bookmarked address stays good.
 * @returns {{ database?: number, web?: number }}
 */
export function rememberedPorts() {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    return {};
  }
}

/** @param {{ database?: number, web?: number }} ports the others stay as they were */
export function rememberPorts(ports) {
  fs.writeFileSync(file, JSON.stringify({ ...rememberedPorts(), ...ports }));
}
