// Builds the address of a workbench: which folder it opens, and which extension and tests it runs.
import path from 'node:path';

/** What the address says. Paths are on this machine, absolute or relative to the current folder. */
export interface WorkbenchAddress {
  /** Host and port of the server. */
  readonly authority: string;
  /** A folder or a `.code-workspace` file; an empty window without it. */
  readonly target?: string | undefined;
  readonly extensionDevelopmentPaths?: readonly string[];
  readonly extensionTestsPath?: string | undefined;
}

/** The address to open in the browser. */
export function workbenchUrl(address: WorkbenchAddress): string {
  const remote = (file: string): string => `vscode-remote://${address.authority}${path.resolve(file)}`;
  const payload = [
    ...(address.extensionDevelopmentPaths ?? []).map((file) => ['extensionDevelopmentPath', remote(file)]),
    ...(address.extensionTestsPath === undefined ? [] : [['extensionTestsPath', remote(address.extensionTestsPath)]]),
    ['skipWelcome', 'true'],
    ['skipReleaseNotes', 'true'],
  ];
  const query = new URLSearchParams({ payload: JSON.stringify(payload) });
  if (address.target === undefined)
    query.set('ew', 'true'); // VS Code's own name for an empty window.
  else query.set(address.target.endsWith('.code-workspace') ? 'workspace' : 'folder', path.resolve(address.target));
  return `http://${address.authority}/?${query.toString()}`;
}
