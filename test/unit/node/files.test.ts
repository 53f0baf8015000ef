// Which files of a folder are read: what is left out, with its reason, and that both ways of asking agree.
import { mkdir, symlink } from 'node:fs/promises';
import { join, relative } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findFiles, readDocument, whyLeftOut } from '../../../server/src/node/files.js';
import { saysGenerated } from '../../../server/src/node/generated.js';
import { compareVersions, isVersion } from '../../../server/src/node/versions.js';
import { temporaryFolder } from '../../support/languageServer.js';

const PAGE = 'Moor the buoy.\n\nCheck its battery.\n\nRead the log.\n';

let folder: Awaited<ReturnType<typeof temporaryFolder>>;
beforeAll(async () => {
  folder = await temporaryFolder({
    '.gitignore': 'drafts/\n*.tmp.md\n!keep.tmp.md\n',
    'index.md': PAGE,
    'drafts/draft.md': PAGE,
    'a.tmp.md': PAGE,
    'keep.tmp.md': PAGE,
    'CHANGELOG.md': PAGE,
    'changelog-1.2.rst': PAGE,
    'history.md': PAGE,
    'guide/change-log.md': PAGE,
    'guide/changing-logs.md': PAGE,
    'archive/old.md': PAGE,
    'guide/plan.draft.md': PAGE,
    'site/package.json': '{}',
    'site/dist/page.html': PAGE,
    'site/docs/build/page.md': PAGE,
    'vendor/other/README.md': PAGE,
    'node_modules/x/README.md': PAGE,
    'v1.9/mooring.md': PAGE,
    'v1.10/mooring.md': `${PAGE}\nOne line more.\n`,
    'v1.10/only-here.md': PAGE,
    'v2/mooring.md': 'Nothing of the old page is left.\n\nIt was written anew.\n',
    'api/latest/list.md': PAGE,
    'api/3.0/list.md': PAGE,
    'generated.md': `<!--\nThis file was generated from the schema.\n-->\n${PAGE}`,
    'picture.png': 'x',
    'openapi.json': '{ "openapi": "3.1.0", "info": { "title": "Buoys" } }',
    // The key stands behind 4,096 bytes, but not behind so many letters.
    'late.yaml': `# ${'ü'.repeat(2100)}\nopenapi: 3.1.0\n`,
    'noise.md': Uint8Array.from([0xff, 0x81]),
  });
  await mkdir(join(folder.path, 'loop'));
  await symlink(folder.path, join(folder.path, 'loop/again'));
});
afterAll(() => folder.dispose());

async function survey(policy?: Parameters<typeof findFiles>[1]) {
  const { documents, leftOut } = await findFiles(folder.path, policy);
  const read = [];
  const reasons = new Map(leftOut.map(({ path, reason }) => [relative(folder.path, path), reason]));
  for (const path of documents) {
    const file = await readDocument(path);
    if ('source' in file) read.push(relative(folder.path, path));
    else reasons.set(relative(folder.path, path), file.leftOut.reason);
  }
  return { read, reasons };
}

describe('the files of a folder', () => {
  it('are read but for what is ignored, built, others’ or told of the past', async () => {
    const { read, reasons } = await survey();
    expect(read).toEqual([
      'api/latest/list.md',
      'archive/old.md',
      'guide/changing-logs.md',
      'guide/plan.draft.md',
      'history.md',
      'index.md',
      'keep.tmp.md',
      'openapi.json',
      'site/docs/build/page.md',
      'v1.10/mooring.md',
      'v1.10/only-here.md',
      'v2/mooring.md',
    ]);
    expect(Object.fromEntries(reasons)).toEqual({
      drafts: 'ignored by .gitignore',
      'a.tmp.md': 'ignored by .gitignore',
      'CHANGELOG.md': 'a change log',
      'changelog-1.2.rst': 'a change log',
      'guide/change-log.md': 'a change log',
      'site/package.json': 'a data file: it describes no interface',
      'late.yaml': 'a data file: it describes no interface',
      'site/dist': 'a folder that a build writes',
      vendor: 'a folder of others’ works',
      node_modules: 'a folder of dependencies or tools',
      'v1.9/mooring.md': 'an older copy of v1.10/mooring.md',
      'api/3.0/list.md': 'an older copy of api/latest/list.md',
      'generated.md': 'says that it is generated',
      'loop/again': 'a link to a folder that was read already',
      'noise.md': 'is not in UTF-8 (line 1) and its encoding cannot be told; save it as UTF-8 to have it read',
    });
  });

  it('are chosen by settings too', async () => {
    const { read, reasons } = await survey({ exclude: ['archive', '**/*.draft.md', 'v*/**'], changeLogs: true });
    expect(reasons.get('archive')).toBe('excluded by a setting');
    expect(reasons.get('guide/plan.draft.md')).toBe('excluded by a setting');
    expect(read).toContain('CHANGELOG.md');
    expect(read.filter((path) => path.startsWith('v') || path.startsWith('archive'))).toEqual([]);
  });

  it('are judged one by one as in a survey of all', async () => {
    const { read, reasons } = await survey();
    for (const path of read) expect(await whyLeftOut(folder.path, join(folder.path, path)), path).toBeUndefined();
    for (const [path, reason] of reasons) {
      if (path === 'noise.md' || path === 'loop/again') continue;
      const file = /\.\w+$/.test(path) ? path : join(path, 'page.md');
      expect(await whyLeftOut(folder.path, join(folder.path, file)), path).toBe(reason);
    }
  });
});

describe('a folder within a repository', () => {
  it('follows the ignore files above it, unless it is ignored as a whole', async () => {
    const repository = await temporaryFolder({
      ...{ '.git/HEAD': 'ref: refs/heads/main\n', '.gitignore': '*.draft.md\nprivate/\n' },
      ...{ 'docs/a.md': PAGE, 'docs/b.draft.md': PAGE, 'private/c.md': PAGE, 'private/d.draft.md': PAGE },
    });
    const found = async (name: string) =>
      (await findFiles(join(repository.path, name))).documents.map((path) => relative(repository.path, path));
    expect(await found('docs')).toEqual(['docs/a.md']);
    expect(await found('private')).toEqual(['private/c.md', 'private/d.draft.md']);
    expect(await whyLeftOut(join(repository.path, 'docs'), join(repository.path, 'docs/b.draft.md'))).toBe(
      'ignored by .gitignore',
    );
    await repository.dispose();
  });
});

describe('versions', () => {
  it('are ordered by the numbers of their parts; names follow numbers', () => {
    const names = ['v1.9', '1.10', '1.10.1', 'version-2.0', '2.x', 'v3', 'stable', 'latest', 'main', 'next'];
    expect([...names].reverse().sort(compareVersions)).toEqual(names);
    expect(['guide', 'v', '2nd', '1.2-beta-notes', 'api'].filter(isVersion)).toEqual([]);
  });
});

describe('a page', () => {
  it('is generated where a comment at its start says so', () => {
    expect(saysGenerated('<!-- @generated -->\n# Commands\n')).toBe(true);
    expect(saysGenerated('.. DO NOT EDIT: generated from the parser\n\nCommands\n')).toBe(true);
    expect(saysGenerated('// Code generated by the builder. DO NOT EDIT.\n= Commands\n')).toBe(true);
    expect(saysGenerated('---\n# This page is auto-generated.\ntitle: x\n---\n')).toBe(true);
    expect(saysGenerated('..\tThis file\n   is generated.\n\nCommands\n')).toBe(true);
    expect(saysGenerated('% First line\r\n% The file was automatically generated.\r\n')).toBe(true);
    expect(saysGenerated(`<!-- This file is generated. ${'It is long. '.repeat(200)}-->\n`)).toBe(true);
  });

  it('is not where its prose speaks of generated files', () => {
    expect(saysGenerated('# Codes\n\nThis file is generated by the buoy. Do not edit it.\n')).toBe(false);
    expect(saysGenerated('<!-- a comment -->\nThis file is generated by the buoy.\n')).toBe(false);
    expect(saysGenerated('.. _codes:\n\nCodes\n=====\n\nThis file is generated by the buoy.\n')).toBe(false);
    expect(saysGenerated('.. note:: This file is generated by the buoy.\n')).toBe(false);
    expect(saysGenerated('// by the crew\n= Codes\n\nThis file is generated by the buoy.\n')).toBe(false);
    expect(saysGenerated('# Codes\n\n---\n# Files\n\nThis file is generated by the buoy.\n')).toBe(false);
    expect(saysGenerated(`${'a '.repeat(600)}\n<!-- @generated -->\n`)).toBe(false);
  });
});
