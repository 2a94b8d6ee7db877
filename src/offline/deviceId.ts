import { v4 } from 'uuid';

const key = 'furlong.deviceId';

/** This browser's name for itself in the order of taps; made once and kept. */
export function deviceId(): string {
  const known = read();
  return known ?? newDeviceId();
}

/** A new name: needed when the counter of the old one was lost with the database. */
export function newDeviceId(): string {
  const made = v4();
  try {
    localStorage.setItem(key, made);
  } catch {
    // Without storage the name lasts as long as the page, and so does the queue.
  }
  return made;
}

function read(): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}
