export function contentHash(
  root: string,
  places: string[],
  counts?: (file: string) => boolean,
): string;
