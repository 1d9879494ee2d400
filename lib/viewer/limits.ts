/** How often something may be tried in a window. Per account and per address apart, so that changing one does not help. */
export const LIMITS = {
  "sign-in-account": { max: 5, windowSeconds: 300 },
  "sign-in-address": { max: 40, windowSeconds: 300 },
  "sign-up-address": { max: 10, windowSeconds: 3600 },
  "link-account": { max: 3, windowSeconds: 600 },
  "link-address": { max: 20, windowSeconds: 600 },
  "token-address": { max: 30, windowSeconds: 60 },
  "password-account": { max: 5, windowSeconds: 900 },
  "invite-account": { max: 60, windowSeconds: 3600 },
  "upload-account": { max: 600, windowSeconds: 3600 },
  "write-account": { max: 600, windowSeconds: 300 },
  "follow-address": { max: 60, windowSeconds: 60 },
} as const satisfies Record<string, { max: number; windowSeconds: number }>;
export type LimitName = keyof typeof LIMITS;
