import fs from 'node:fs';

/**
 * Every other process this one can see, zombies left out. Meant for a process namespace of its own:
 * there it means everything that was started and is still running.
 * @returns {{ pid: number, command: string }[]}
 */
export function findPeers() {
  return fs
    .readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .flatMap((name) => {
      try {
        // A zombie (nobody has asked for its exit code yet) has no command line any more.
        const command = fs
          .readFileSync(`/proc/${name}/cmdline`, 'utf8')
          .replaceAll('\0', ' ')
          .trim();
        return command ? [{ pid: Number(name), command }] : [];
      } catch {
        return [];
      }
    });
}
