/** Stands in for the `server-only` package under test, where there is no client bundle to keep clean. */
export {};
