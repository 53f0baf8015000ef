// Tells descriptions of interfaces and schemas of data from the many other files in YAML and JSON.

/** So much of a file's start tells what it is, in bytes. */
export const TELLING_START = 4096;

/** OpenAPI (2 as `swagger`, 3) and AsyncAPI name their version in a key of the outermost object. */
const INTERFACE = /(?:^|[{,\n])\s*["']?(?:openapi|swagger|asyncapi)["']?\s*:\s*["']?\d/;
const SCHEMA = /(?:^|[{,\n])\s*["']?\$schema["']?\s*:\s*["']?https?:\/\/json-schema\.org\//;

/** True where the start of a YAML or JSON text says that it describes an interface (OpenAPI, AsyncAPI) or is a JSON Schema. */
export function describesInterface(text: string): boolean {
  const start = text.slice(0, TELLING_START);
  return INTERFACE.test(start) || SCHEMA.test(start);
}
