// The one error that says that no workbench can be had here, which is no failure of the extension.

/** Thrown when VS Code or a browser to show it in cannot be had. */
export class NoWorkbench extends Error {}

/** Runs `prepare`. @throws {NoWorkbench} whatever it throws, so that what comes after it can fail as itself. */
export async function needed<T>(what: string, prepare: () => Promise<T>): Promise<T> {
  try {
    return await prepare();
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new NoWorkbench(`${what}: ${reason}`, { cause: error });
  }
}
