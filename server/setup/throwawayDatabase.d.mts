/**
 * A MariaDB in a temporary folder, durability off. `url` is `mariadb://root:<password>@127.0.0.1:
 * <port>/` without a database's name; `stop` ends the server and removes the folder.
 */
export function startThrowawayDatabase(): Promise<{ url: string; stop: () => Promise<void> }>;
