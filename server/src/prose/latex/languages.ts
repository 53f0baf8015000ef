// Languages by the names that babel and polyglossia give them, and what a document says of its own.
import { primaryLanguage } from '../../text/language.js';

const TAGS: Readonly<Record<string, string>> = {
  ...{ english: 'en', american: 'en-US', usenglish: 'en-US', british: 'en-GB', ukenglish: 'en-GB', canadian: 'en-CA' },
  ...{ australian: 'en-AU', newzealand: 'en-NZ', german: 'de', ngerman: 'de', germanb: 'de', austrian: 'de-AT' },
  ...{ naustrian: 'de-AT', swissgerman: 'de-CH', nswissgerman: 'de-CH', french: 'fr', francais: 'fr', frenchb: 'fr' },
  ...{ acadian: 'fr-CA', canadien: 'fr-CA', spanish: 'es', catalan: 'ca', galician: 'gl', basque: 'eu' },
  ...{ portuguese: 'pt', portuges: 'pt', brazilian: 'pt-BR', brazil: 'pt-BR', italian: 'it', romanian: 'ro' },
  ...{ dutch: 'nl', afrikaans: 'af', danish: 'da', norsk: 'nb', norwegian: 'nb', nynorsk: 'nn', swedish: 'sv' },
  ...{ finnish: 'fi', icelandic: 'is', estonian: 'et', latvian: 'lv', lithuanian: 'lt', polish: 'pl', czech: 'cs' },
  ...{ slovak: 'sk', slovene: 'sl', slovenian: 'sl', croatian: 'hr', serbian: 'sr', serbianc: 'sr-Cyrl' },
  ...{ bosnian: 'bs', bulgarian: 'bg', macedonian: 'mk', russian: 'ru', ukrainian: 'uk', belarusian: 'be' },
  ...{
    hungarian: 'hu',
    magyar: 'hu',
    turkish: 'tr',
    greek: 'el',
    hebrew: 'he',
    arabic: 'ar',
    persian: 'fa',
    farsi: 'fa',
  },
  ...{ hindi: 'hi', bengali: 'bn', tamil: 'ta', thai: 'th', vietnamese: 'vi', indonesian: 'id', bahasa: 'id' },
  ...{ malay: 'ms', japanese: 'ja', korean: 'ko', chinese: 'zh', latin: 'la', welsh: 'cy', irish: 'ga', breton: 'br' },
  ...{ esperanto: 'eo', albanian: 'sq', armenian: 'hy', georgian: 'ka', mongolian: 'mn', scottish: 'gd' },
};
const TAG = /^[a-z]{2,3}(?:-[A-Za-z0-9]{2,8})*$/;

/** The BCP 47 tag of a language by its name, or undefined. A name can be a tag itself, as babel allows. */
export function languageTag(name: string): string | undefined {
  const known = name.trim();
  if (Object.hasOwn(TAGS, known)) return TAGS[known];
  return TAG.test(known) ? known : undefined;
}

/** The tag of a language by the name that babel and polyglossia give it alone, not by a tag. */
export function namedLanguage(name: string): string | undefined {
  return Object.hasOwn(TAGS, name) ? TAGS[name] : undefined;
}

/** True where two tags name one language, whatever the region. */
export function isSameLanguage(a: string, b: string): boolean {
  return primaryLanguage(a) === primaryLanguage(b);
}

const COMMENT = /(?<!\\)%.*/g;
const STATED = [
  /\\(?:setdefaultlanguage|setmainlanguage)(?:\s*\[[^\]]{0,200}\])?\s*\{([^{}]{1,40})\}/,
  /\\babelprovide\s*\[[^\]]{0,200}\bmain\b[^\]]{0,200}\]\s*\{([^{}]{1,40})\}/,
];
const BABEL = /\\usepackage(?:\s*\[([^\]]{0,500})\])?\s*\{[^{}]{0,200}\bbabel\b/;
const CLASS = /\\documentclass\s*\[([^\]]{0,500})\]/;
const MAIN = /\bmain\s*=\s*([A-Za-z-]+)/;

/**
 * The language that a preamble states, or undefined: the last option of babel is the document's, and where that has none
 * the last of its class.
 */
export function statedLanguage(preamble: string): string | undefined {
  const text = preamble.replace(COMMENT, '');
  for (const pattern of STATED) {
    const name = pattern.exec(text)?.[1];
    const tag = name === undefined ? undefined : languageTag(name);
    if (tag !== undefined) return tag;
  }
  const babel = BABEL.exec(text);
  if (!babel) return undefined;
  const main = MAIN.exec(babel[1] ?? '')?.[1];
  return main === undefined ? (lastLanguage(babel[1]) ?? lastLanguage(CLASS.exec(text)?.[1])) : languageTag(main);
}

function lastLanguage(options: string | undefined): string | undefined {
  const names = options?.split(',').map((option) => option.trim()) ?? [];
  const last = names.findLast((name) => Object.hasOwn(TAGS, name));
  return last === undefined ? undefined : TAGS[last];
}
