import { join } from "node:path";

/** Where one private database lives and listens. */
export type DatabasePlace = { folder: string; port: number; socket: string; asRoot: boolean };

/** The settings file of the private database: reachable from this machine alone, and nothing acknowledged is ever lost. */
export function databaseSettings({ folder, port, socket, asRoot }: DatabasePlace): string {
  const lines = [
    "[mariadbd]",
    ...(asRoot ? ["user=root"] : []),
    `datadir=${join(folder, "data")}`,
    `tmpdir=${join(folder, "tmp")}`,
    `socket=${socket}`,
    `pid-file=${join(folder, "database.pid")}`,
    `log-error=${join(folder, "database.log")}`,
    "bind-address=127.0.0.1",
    `port=${port}`,
    "skip-name-resolve",
    "symbolic-links=0",
    "local-infile=OFF",
    "character-set-server=utf8mb4",
    "collation-server=utf8mb4_nopad_bin",
    "default-time-zone=+00:00",
    "explicit-defaults-for-timestamp=ON",
    "sql-mode=STRICT_TRANS_TABLES,NO_ZERO_DATE,NO_ZERO_IN_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION,ONLY_FULL_GROUP_BY",
    "transaction-isolation=READ-COMMITTED",
    "innodb-flush-log-at-trx-commit=1",
    "innodb-flush-method=O_DIRECT",
    "innodb-doublewrite=ON",
    "innodb-rollback-on-timeout=ON",
    "innodb-lock-wait-timeout=10",
    "sync-binlog=1",
    "innodb-buffer-pool-size=256M",
    "innodb-log-file-size=64M",
    "max-connections=150",
    "max-allowed-packet=16M",
    "performance-schema=OFF",
  ];
  return `${lines.join("\n")}\n`;
}
