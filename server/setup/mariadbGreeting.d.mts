export function speaksMariadb(port: number, withinMs?: number): Promise<boolean>;
export function isGreeting(bytes: Uint8Array): boolean;
