/** Stands in for the package "server-only" where server files run outside Next, which would otherwise refuse to load them. */
export {};
