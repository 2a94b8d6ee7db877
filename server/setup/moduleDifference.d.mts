export interface LockedPackage {
  version?: string;
  optional?: boolean;
  os?: string[];
  cpu?: string[];
}
export interface Lock {
  packages?: Record<string, LockedPackage>;
}
export function moduleDifference(
  wanted: Lock,
  installed: Lock | undefined,
  machine: { os: string; cpu: string },
): string | undefined;
