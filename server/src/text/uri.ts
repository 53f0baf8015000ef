// One spelling for each URI: editors and file systems escape the same path differently.

/**
 * The canonical spelling of a URI, by which the engine knows a document: scheme and drive letter in lower case, each
 * segment of the path unescaped as far as UTF-8 goes and escaped again (RFC 3986, section 6.2.2).
 */
export function canonicalUri(uri: string): string {
  const match = /^([A-Za-z][A-Za-z0-9+.-]*):(\/\/[^/?#]*)?([^?#]*)(.*)$/s.exec(uri);
  if (match === null) return uri;
  const [, scheme, authority = '', path, rest] = match;
  const segments = path!.split('/').map((segment) => encodeURIComponent(unescaped(segment)));
  const drive = segments[1];
  if (drive !== undefined && /^[A-Za-z]%3A$/.test(drive)) segments[1] = `${drive[0]!.toLowerCase()}%3A`;
  return `${scheme!.toLowerCase()}:${authority}${segments.join('/')}${rest!}`;
}

function unescaped(segment: string): string {
  try {
    return decodeURIComponent(segment);
  } catch {
    return segment;
  }
}

/** True where a document stands in a folder or below it; both canonical, the folder with or without its closing slash. */
export function isBelow(folder: string, document: string): boolean {
  return document.startsWith(folder.endsWith('/') ? folder : `${folder}/`);
}
