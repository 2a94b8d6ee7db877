export function readyUrl(line: string): string | undefined;
