export function mariadbArguments(place: {
  dataDir: string;
  port: number;
  initFile: string;
  logFile: string;
  asRoot: boolean;
  throwaway: boolean;
}): string[];
export function installDbArguments(place: {
  dataDir: string;
  asRoot: boolean;
  systemUser: string;
}): string[];
