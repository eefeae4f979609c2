/** Version of the session format written now. */
export const currentVersion = 1;

type Migration = (session: Record<string, unknown>) => Record<string, unknown>;

/** From version n to n + 1, by n. Old links are kept in e2e/links for ever and must still open. */
const migrations: Readonly<Record<number, Migration>> = {};

/**
 * Brings a session of an older version up to date, one migration after the other.
 *
 * @returns the session, or null where its version is not a whole number or newer than this page knows
 */
export function migrate(session: Record<string, unknown>): Record<string, unknown> | null {
  let now = session;
  let version = now['version'];
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1 || version > currentVersion) return null;
  while (version < currentVersion) {
    const step = migrations[version];
    if (step === undefined) return null;
    version += 1;
    now = { ...step(now), version };
  }
  return now;
}
