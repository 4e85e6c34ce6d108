/** Name of the database that keeps one person's unsaved work in this browser; deleted as a whole at sign-out. */
export const unsavedDatabase = (personId: string): string => `couplet-unsaved-${personId}`;

/** A database that another tab still holds open is left to that tab after this long. */
const PATIENCE_MS = 1500;

/** Deletes what the bench has kept in this browser for a person. Never throws and never holds up the way out for long. */
export function forgetUnsavedWork(personId: string): Promise<void> {
  if (personId === '' || typeof indexedDB === 'undefined') return Promise.resolve();
  return new Promise((resolve) => {
    const request = indexedDB.deleteDatabase(unsavedDatabase(personId));
    request.onsuccess = request.onerror = () => resolve();
    setTimeout(resolve, PATIENCE_MS);
  });
}
