// Language tags, and the language that a path names: fr/start.md, i18n/pt-BR/start.md, start.zh-CN.md.
import type { SourceText } from './sourceText.js';

/** ISO 639-1. */
const TWO_LETTERS = new Set(
  (
    'aa ab ae af ak am an ar as av ay az ba be bg bi bm bn bo br bs ca ce ch co cr cs cu cv cy da de dv dz ee el en eo es et eu ' +
    'fa ff fi fj fo fr fy ga gd gl gn gu gv ha he hi ho hr ht hu hy hz ia id ie ig ii ik io is it iu ja jv ka kg ki kj kk kl ' +
    'km kn ko kr ks ku kv kw ky la lb lg li ln lo lt lu lv mg mh mi mk ml mn mr ms mt my na nb nd ne ng nl nn no nr nv ny oc ' +
    'oj om or os pa pi pl ps pt qu rm rn ro ru rw sa sc sd se sg si sk sl sm sn so sq sr ss st su sv sw ta te tg th ti tk tl ' +
    'tn to tr ts tt tw ty ug uk ur uz ve vi vo wa wo xh yi yo za zh zu'
  ).split(' '),
);

/** Tags that mean the same as another: the two written forms of Norwegian are read as one, codes of old and of three letters. */
const SAME: Readonly<Record<string, string>> = {
  ...{
    nb: 'no',
    nn: 'no',
    nob: 'no',
    nno: 'no',
    nor: 'no',
    iw: 'he',
    in: 'id',
    ji: 'yi',
    cmn: 'zh',
    zho: 'zh',
    eng: 'en',
  },
  ...{ fra: 'fr', deu: 'de', spa: 'es', ita: 'it', por: 'pt', nld: 'nl', rus: 'ru', jpn: 'ja', kor: 'ko', pol: 'pl' },
};

/** A subtag of script or region, with or without one of script before it: Hans, BR, 419, Hant-TW. */
const FURTHER = '(?:[-_](?:[A-Z][a-z]{3}|[A-Z]{2}|[a-z]{2}|\\d{3})){1,2}';
const FOLDER = new RegExp(`^(?:([a-z]{2})|([a-z]{2,3})${FURTHER})$`);
const SUFFIX = new RegExp(`[^.]\\.([a-z]{2,3})(?:${FURTHER})?\\.[A-Za-z]+$`);

/** The primary subtag of a BCP 47 tag, in one form for each language; undefined for what is no tag. */
export function primaryLanguage(tag: string | undefined): string | undefined {
  const subtag = /^\s*([a-z]{2,3})(?=$|[-_\s])/i.exec(tag ?? '')?.[1]?.toLowerCase();
  if (subtag === undefined) return undefined;
  return Object.hasOwn(SAME, subtag) ? SAME[subtag] : subtag;
}

const TAG = /^[A-Za-z]{2,3}(?:[-_][A-Za-z0-9]{1,8})*$/;

/** The language tag that is written, with hyphens for underscores; undefined for what has not the form of one (BCP 47, RFC 5646, section 2.1). */
export function writtenTag(written: string): string | undefined {
  const tag = written.trim();
  return TAG.test(tag) ? tag.replaceAll('_', '-') : undefined;
}

/**
 * The language that the path of a document names, by the suffix of the file before its extension, else by the outermost folder
 * that is a language tag. A hint and no more: `cs/` may as well be about C#.
 * @param path below the documentation's root, parts joined by slashes, escaped or not
 */
export function languageOfPath(path: string): string | undefined {
  const parts = path.split('/');
  const file = parts.pop() ?? '';
  const suffix = SUFFIX.exec(file)?.[1];
  if (suffix !== undefined && isLanguage(suffix)) return primaryLanguage(suffix);
  for (const part of parts) {
    const match = FOLDER.exec(part);
    const code = match?.[1] ?? match?.[2];
    if (code !== undefined && isLanguage(code)) return primaryLanguage(code);
  }
  return undefined;
}

function isLanguage(code: string): boolean {
  return code.length === 2 ? TWO_LETTERS.has(code) : Object.hasOwn(SAME, code);
}

/** A document of a folder, with the language that its path below the folder names. Both URIs in canonical form. */
export function withPathLanguage(source: SourceText, folderUri: string): SourceText {
  const root = folderUri.endsWith('/') ? folderUri : `${folderUri}/`;
  const pathLanguage = source.uri.startsWith(root) ? languageOfPath(source.uri.slice(root.length)) : undefined;
  return pathLanguage === undefined ? source : { ...source, pathLanguage };
}
