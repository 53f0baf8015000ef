// The command line's words: which options a subcommand takes, and what is wrong with those given.

/** One option: a switch, or one with a value; `choices` limits the value. */
export interface OptionRule {
  readonly value?: string;
  readonly choices?: readonly string[];
  readonly help: string;
}

/** What was given: values by option name, `true` for a switch, and the rest in order. */
export interface Given {
  readonly options: ReadonlyMap<string, string | true>;
  readonly operands: readonly string[];
}

/** The command line cannot be understood. */
export class UsageError extends Error {
  override readonly name = 'UsageError';
}

/**
 * Reads options (`--name value`, `--name=value`, `--switch`) and operands; `--` ends the options.
 * @throws UsageError for an unknown option, a missing value or one that is not among the choices.
 */
export function readOptions(words: readonly string[], rules: Readonly<Record<string, OptionRule>>): Given {
  const options = new Map<string, string | true>();
  const operands: string[] = [];
  for (let i = 0; i < words.length; i++) {
    const word = words[i]!;
    if (word === '--') {
      operands.push(...words.slice(i + 1));
      break;
    }
    if (!word.startsWith('-') || word === '-') {
      operands.push(word);
      continue;
    }
    const [name, inline] = splitOnce(word.replace(/^--?/, ''), '=');
    const rule = Object.hasOwn(rules, name) ? rules[name] : undefined;
    if (rule === undefined) throw new UsageError(`There is no option ${word.split('=')[0]!}; --help lists them.`);
    if (rule.value === undefined) {
      if (inline !== undefined) throw new UsageError(`--${name} takes no value.`);
      options.set(name, true);
      continue;
    }
    const value = inline ?? words[++i];
    if (value === undefined) throw new UsageError(`--${name} needs a value: --${name} ${rule.value}.`);
    if (rule.choices?.includes(value) === false) {
      throw new UsageError(`--${name} takes ${rule.choices.join(', ')}; “${value}” is none of them.`);
    }
    options.set(name, value);
  }
  return { options, operands };
}

function splitOnce(text: string, mark: string): [string, string | undefined] {
  const at = text.indexOf(mark);
  return at < 0 ? [text, undefined] : [text.slice(0, at), text.slice(at + 1)];
}
