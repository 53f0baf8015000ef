// What a folder's names and ignore files say against reading a path in it, each with a reason for a person.
import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { dirname, join, relative, sep } from 'node:path';
import ignore from 'ignore';
import type { Ignore } from 'ignore';
import picomatch from 'picomatch';
import type { FilePolicy } from '../text/filePolicy.js';

/** Folders that hold no documentation of the project's own, wherever they stand. */
const NEVER_ENTERED = new Set([
  ...['node_modules', 'bower_components', 'site-packages', '.git', '.hg', '.svn', '.venv', '__pycache__', '.idea'],
  ...['.vscode-test', '.tox', '.cache'],
]);
const VENDORED = new Set(['vendor', 'third_party', 'third-party']);
/** Folders that a build writes; common practice, no source. Where nothing beside them builds, they may be documentation. */
const OUTPUT = new Set(['dist', 'build', 'out', 'target', '_build', '_site', 'public']);
/** Files by which a folder is known to be built, in lower case. */
const BUILD_FILES = new Set([
  ...['package.json', 'pom.xml', 'build.gradle', 'build.gradle.kts', 'cargo.toml', 'makefile', 'cmakelists.txt'],
  ...['conf.py', 'pyproject.toml', 'setup.py', 'go.mod', 'mkdocs.yml', '_config.yml', 'config.toml', 'hugo.toml'],
]);
const CHANGE_LOG = /^(?:change[-_]?log|CHANGES|HISTORY|NEWS|RELEASES)(?:[-_. ]?v?\d[\w.-]*)?(?:\.\w+)?$/;
const CHANGE_LOG_ANY_CASE = /^change[-_]?log(?:[-_. ]?v?\d[\w.-]*)?(?:\.\w+)?$/i;

/** The rules in force in one folder: those of its own ignore file and of the folders above it. */
export class FolderRules {
  private constructor(
    private readonly root: string,
    private readonly policy: FilePolicy,
    private readonly excluded: (path: string) => boolean,
    private readonly ignores: readonly { readonly folder: string; readonly rules: Ignore }[],
    private readonly builds: boolean,
  ) {}

  /** The rules of a folder that a survey begins with. `names` are the names in it. */
  static async ofRoot(root: string, names: readonly string[], policy: FilePolicy): Promise<FolderRules> {
    const excluded = picomatch([...policy.exclude], { dot: true });
    const above = new FolderRules(root, policy, excluded, await ignoresAbove(root), false);
    // A folder that is ignored itself was named all the same: its user wants it read.
    const outer = above.isIgnored(root, true) ? new FolderRules(root, policy, excluded, [], false) : above;
    return outer.within(root, names);
  }

  /** The rules of a folder below. */
  async within(folder: string, names: readonly string[]): Promise<FolderRules> {
    const ignores = names.includes('.gitignore') ? [...this.ignores, await ignoreFile(folder)] : this.ignores;
    const builds = names.some((name) => BUILD_FILES.has(name.toLowerCase()));
    return new FolderRules(this.root, this.policy, this.excluded, ignores, builds);
  }

  /** Why a folder in this one is not entered, or undefined. */
  againstFolder(path: string, name: string): string | undefined {
    if (NEVER_ENTERED.has(name)) return 'a folder of dependencies or tools';
    if (VENDORED.has(name)) return 'a folder of others’ works';
    if (this.builds && OUTPUT.has(name)) return 'a folder that a build writes';
    return this.againstPath(path, true);
  }

  /** Why a file in this folder is not read, or undefined. */
  againstFile(path: string, name: string): string | undefined {
    if (!this.policy.changeLogs && (CHANGE_LOG.test(name) || CHANGE_LOG_ANY_CASE.test(name))) return 'a change log';
    return this.againstPath(path, false);
  }

  private againstPath(path: string, isFolder: boolean): string | undefined {
    if (this.isIgnored(path, isFolder)) return 'ignored by .gitignore';
    return this.excluded(slashed(this.root, path)) ? 'excluded by a setting' : undefined;
  }

  private isIgnored(path: string, isFolder: boolean): boolean {
    let ignored = false;
    for (const { folder, rules } of this.ignores) {
      const verdict = rules.test(slashed(folder, path) + (isFolder ? '/' : ''));
      if (verdict.ignored) ignored = true;
      else if (verdict.unignored) ignored = false;
    }
    return ignored;
  }
}

/** The ignore files of the folders above, up to the root of the repository; none where there is no repository. */
async function ignoresAbove(root: string): Promise<{ folder: string; rules: Ignore }[]> {
  const found: { folder: string; rules: Ignore }[] = [];
  for (let at = root; !existsSync(join(at, '.git'));) {
    if (dirname(at) === at) return [];
    at = dirname(at);
    if (existsSync(join(at, '.gitignore'))) found.unshift(await ignoreFile(at));
  }
  return found;
}

async function ignoreFile(folder: string): Promise<{ folder: string; rules: Ignore }> {
  const text = await readFile(join(folder, '.gitignore'), 'utf8').catch(() => '');
  return { folder, rules: ignore().add(text) };
}

/** A path below a folder, relative to it, with `/` between its parts. */
export function slashed(folder: string, path: string): string {
  return relative(folder, path).split(sep).join('/');
}
