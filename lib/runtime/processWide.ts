/**
 * One instance of something for the whole process.
 *
 * The server and the bundles that Next.js builds each load their own copy of a module, so a module-level variable
 * would exist more than once. What must be single (the database pool, the usage buffer, the key directory) lives here.
 */
export function processWide<T>(name: string, create: () => T): T {
  const instances = globalThis as unknown as Record<symbol, T | undefined>;
  const slot = Symbol.for(`averduct.${name}`);
  return (instances[slot] ??= create());
}
