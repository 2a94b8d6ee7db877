export function debianSources(
  targets: string,
  release: string,
): { mirror: string; aptSources: string };
