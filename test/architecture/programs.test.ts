// Nothing of a workspace is ever run: no setting names a program, and one file alone starts one.
import { readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';

interface Schema {
  readonly type?: string | readonly string[];
  readonly enum?: readonly unknown[];
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly additionalProperties?: boolean | Schema;
  readonly items?: Schema;
}

const root = resolve(import.meta.dirname, '../..');
const manifest = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as {
  readonly contributes: { readonly configuration: { readonly properties: Readonly<Record<string, Schema>> } };
};
const settings = Object.entries(manifest.contributes.configuration.properties);

/** The places in a setting where any text may stand: there a program could be named. */
function freeTexts(name: string, schema: Schema): string[] {
  const { type, properties = {}, additionalProperties = true, items } = schema;
  if (schema.enum !== undefined) return [];
  const types = typeof type === 'string' ? [type] : (type ?? ['string']);
  return types.flatMap((each) => {
    if (each === 'boolean' || each === 'number' || each === 'integer' || each === 'null') return [];
    if (each === 'array') return items === undefined ? [name] : freeTexts(`${name}[]`, items);
    if (each !== 'object') return [name];
    const rest =
      additionalProperties === false
        ? []
        : freeTexts(`${name}.*`, additionalProperties === true ? {} : additionalProperties);
    return [...Object.entries(properties).flatMap(([key, own]) => freeTexts(`${name}.${key}`, own)), ...rest];
  });
}

const filesUnder = (folder: string): string[] =>
  readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.ts'))
    .map((name) => join(folder, name).replaceAll('\\', '/'))
    .sort();

describe('no setting names a program', () => {
  it('for none takes a text that is not one of a list', () => {
    expect(settings.length).toBeGreaterThan(0);
    expect(settings.flatMap(([name, schema]) => freeTexts(name, schema))).toEqual([]);
  });

  it('as a setting that did would be found', () => {
    expect(freeTexts('gitPath', { type: 'string' })).toEqual(['gitPath']);
    expect(freeTexts('tools', { type: 'object' })).toEqual(['tools.*']);
    expect(freeTexts('tools', { type: 'array', items: { type: ['string', 'null'] } })).toEqual(['tools[]']);
    const open = { type: 'object', properties: { on: { type: 'boolean' }, path: {} }, additionalProperties: false };
    expect(freeTexts('tool', open)).toEqual(['tool.path']);
  });
});

describe('programs are started', () => {
  const starting = [...filesUnder('server/src'), ...filesUnder('client/src')].filter((file) =>
    /child_process|\bexecFile|\bfork\(|createTerminal|ProcessExecution|ShellExecution/.test(
      readFileSync(join(root, file), 'utf8'),
    ),
  );

  it('by one file alone, without a shell', () => {
    expect(starting).toEqual(['server/src/node/history/git.ts']);
    const text = readFileSync(join(root, starting[0]!), 'utf8');
    expect(text.match(/\bspawn\(/g)).toHaveLength(1);
    expect(text).toContain('shell: false');
  });
});
