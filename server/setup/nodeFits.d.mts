export function nodeFits(version: string, range: string): boolean;
