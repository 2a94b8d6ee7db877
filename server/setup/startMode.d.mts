export interface StartMode {
  databaseUrl: string | undefined;
  host: string;
  port: number | undefined;
  nodeEnv: string;
  demo: boolean;
  noDemoBecause: string | undefined;
}
export function startMode(env: Record<string, string | undefined>): StartMode;
