/**
 * One value for the whole process. A bundler may load a file more than once (route handlers, start-up hook);
 * a database connection or a job runner must exist once all the same.
 */
export function processSingleton<T>(name: string, make: () => T): T {
  const key = Symbol.for(`stillwell.${name}`);
  const store = globalThis as unknown as Record<symbol, T | undefined>;
  store[key] ??= make();
  return store[key];
}
