import "server-only";
import { env } from "@/lib/env";

/** How the file service's library is set up, on every side of ours. Logs below warnings would print signed addresses. */
export function serviceSettings() {
  const given = env();
  return {
    token: given.UPLOADTHING_TOKEN,
    logLevel: "Warning",
    ...(given.UPLOADTHING_API_URL && { apiUrl: given.UPLOADTHING_API_URL }),
    ...(given.UPLOADTHING_INGEST_URL && { ingestUrl: given.UPLOADTHING_INGEST_URL }),
    ...(given.UPLOADTHING_UFS_HOST && { ufsHost: given.UPLOADTHING_UFS_HOST }),
    ...(given.UPLOADTHING_UFS_APP_ID_LOCATION && { ufsAppIdLocation: given.UPLOADTHING_UFS_APP_ID_LOCATION }),
  } as const;
}
