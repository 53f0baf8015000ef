// Paths and folders as a reader of the report sees them: relative to the folder that the report is about.

/** The path of a document below a folder, unescaped; the whole URI where it does not stand below it. */
export function pathBelow(rootUri: string, uri: string): string {
  const root = rootUri.endsWith('/') ? rootUri : `${rootUri}/`;
  return uri.startsWith(root) ? unescaped(uri.slice(root.length)) : uri;
}

/** The name of a folder by its URI; the URI itself where its path is empty. */
export function folderName(rootUri: string): string {
  const segments = rootUri.replace(/\/+$/, '').split('/');
  return unescaped(segments[segments.length - 1]!) || rootUri;
}

/**
 * Parts pages into the folders that stand side by side: the first ones below the deepest folder that holds all pages.
 * Pages that stand in that folder itself are in the folder named by it, or `.` where it is the report's own.
 */
export function folderOfPages(paths: readonly string[]): (path: string) => string {
  let common = paths[0]?.split('/').slice(0, -1) ?? [];
  for (const path of paths) {
    const folders = path.split('/').slice(0, -1);
    let same = 0;
    while (same < common.length && common[same] === folders[same]) same++;
    common = common.slice(0, same);
  }
  return (path) => {
    const folders = path.split('/').slice(0, -1);
    return folders.slice(0, common.length + 1).join('/') || '.';
  };
}

function unescaped(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}
