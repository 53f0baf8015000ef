// Reads the arguments that @vscode/test-electron gives to the executable of VS Code.

/** What the arguments ask for; options that only a desktop build knows are passed over. */
export interface CodeArguments {
  readonly extensionDevelopmentPaths: readonly string[];
  readonly extensionTestsPath: string | undefined;
  readonly userData: string | undefined;
  readonly extensions: string | undefined;
  /** The folder or the `.code-workspace` file to open. */
  readonly target: string | undefined;
}

/** Options with a value; the value follows after `=` or as the next argument. */
const valued = new Set(['extensionDevelopmentPath', 'extensionTestsPath', 'user-data-dir', 'extensions-dir']);

/** Reads `argv` (without executable and script). @throws when an option that needs a value has none. */
export function readArguments(argv: readonly string[]): CodeArguments {
  const options = new Map<string, string[]>();
  const targets: string[] = [];
  for (let i = 0; i < argv.length; i++) {
    const argument = argv[i] ?? '';
    const match = /^--([^=]+)(?:=(.*))?$/s.exec(argument);
    const name = match?.[1];
    if (name === undefined) targets.push(argument);
    else if (valued.has(name)) {
      const value = match?.[2] ?? argv[++i];
      if (value === undefined) throw new Error(`--${name} needs a value`);
      options.set(name, [...(options.get(name) ?? []), value]);
    }
  }
  const one = (name: string): string | undefined => options.get(name)?.at(-1);
  return {
    extensionDevelopmentPaths: options.get('extensionDevelopmentPath') ?? [],
    extensionTestsPath: one('extensionTestsPath'),
    userData: one('user-data-dir'),
    extensions: one('extensions-dir'),
    target: targets[0],
  };
}
