/** Stops before the first test, in one sentence, when no database was named. */
export function setup(): void {
  if (!process.env.TEST_DATABASE_ADMIN_URL) {
    throw new Error("TEST_DATABASE_ADMIN_URL is not set: these tests need a MariaDB where they may create databases.");
  }
}
