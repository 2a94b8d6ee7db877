const QUIET_MS = 1_200;
const STILL_AT_WORK_MS = 15_000;

/** Prints one line for the person at the terminal. @param {string} line */
export function say(line) {
  console.log(line);
}

/**
 * Runs one step of the set-up. A quick step stays silent; one that takes longer says what it is
 * doing, repeats itself now and then, and tells how long it took.
 * @template T
 * @param {string} label what is being done, e.g. 'Building the client'
 * @param {(progress: (detail: string) => void) => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(label, work) {
  const startedAt = Date.now();
  const seconds = () => ((Date.now() - startedAt) / 1000).toFixed(1);
  let spoke = false;
  let detail = '';
  const first = setTimeout(() => {
    spoke = true;
    say(`${label} …`);
  }, QUIET_MS);
  const again = setInterval(
    () => say(`${label} … ${detail ? `${detail}, ` : ''}${seconds()} s so far`),
    STILL_AT_WORK_MS,
  );
  try {
    const result = await work((now) => {
      detail = now;
    });
    if (spoke) say(`${label}: done in ${seconds()} s`);
    return result;
  } finally {
    clearTimeout(first);
    clearInterval(again);
  }
}
