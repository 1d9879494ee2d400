/** An environment that env() takes, for tests: nothing listens behind it unless a test starts it. */
export const TEST_ENVIRONMENT: Record<string, string> = {
  NODE_ENV: "test",
  APP_URL: "http://localhost:4999",
  DATABASE_POOL: "8",
  AUTH_SECRET: "only-for-tests-only-for-tests-only-for-tests",
  SMTP_URL: "smtp://127.0.0.1:1",
  MAIL_FROM: "Towfolio tests <cases@example.test>",
  UPLOADTHING_TOKEN: Buffer.from(JSON.stringify({ apiKey: "sk_test_only", appId: "testapp", regions: ["local"], ingestHost: "x" })).toString("base64"),
  STRIPE_SECRET_KEY: "sk_test_only_for_tests",
  STRIPE_WEBHOOK_SECRET: "whsec_only_for_tests",
};
