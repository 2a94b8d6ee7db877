export function aptCommands(packages: string[]): string[][];
export function aptCommandToPaste(packages: string[]): string;
