/** One place where the viewer is signed in. */
export type SessionView = { sessionId: string; device: string; startedAt: string; lastUsedAt: string; current: boolean };

export type AccountView = { name: string; email: string; hasPassword: boolean; sessions: SessionView[] };
