export interface MariadbPlace {
  dataDir: string;
  port: number;
  initFile: string;
  logFile: string;
  asRoot: boolean;
  throwaway: boolean;
}
export function mariadbArguments(place: MariadbPlace): string[];
export function installDbArguments(place: {
  dataDir: string;
  asRoot: boolean;
  systemUser: string;
}): string[];
