// Tags and paths: one form for each language, and the language that a page's path names.
import { describe, expect, test } from 'vitest';
import { languageOfPath, primaryLanguage, withPathLanguage, writtenTag } from '../../../server/src/text/language.js';

describe('a language tag', () => {
  // Primary subtags as RFC 5646 (BCP 47) gives them in appendix A; `iw` and `in` are the registry's old codes of `he` and `id`.
  test.each([
    ['de', 'de'],
    ['i-enochian', undefined],
    ['zh-Hant', 'zh'],
    ['sr-Latn-RS', 'sr'],
    ['de-CH-1901', 'de'],
    ['es-419', 'es'],
    ['EN_us', 'en'],
    ['iw', 'he'],
    ['in', 'id'],
    ['nb-NO', 'no'],
    ['', undefined],
    [undefined, undefined],
    ['English', undefined],
  ])('%s is of %s', (tag, language) => {
    expect(primaryLanguage(tag)).toBe(language);
  });
});

describe('a written tag', () => {
  // Forms of RFC 5646, appendix A; generators write underscores too (common practice, no source).
  test.each([
    ['pt_BR', 'pt-BR'],
    [' zh-Hant ', 'zh-Hant'],
    ['en-US-u-islamcal', 'en-US-u-islamcal'],
    ['en us', undefined],
    ['english', undefined],
    ['{{ lang }}', undefined],
    ['', undefined],
  ])('“%s” is %s', (written, tag) => {
    expect(writtenTag(written)).toBe(tag);
  });
});

describe('the path of a page', () => {
  test.each([
    ['fr/start.md', 'fr'],
    ['docs/zh-CN/start.md', 'zh'],
    ['i18n/pt_BR/docs/start.md', 'pt'],
    ['zh-Hant-TW/start.md', 'zh'],
    ['es-419/start.md', 'es'],
    ['guide/start.fr.md', 'fr'],
    ['en/start.zh-Hans.rst', 'zh'],
    ['fr/cs/start.md', 'fr'],
    ['start.md', undefined],
    ['api/cli.md', undefined],
    ['Fr/start.md', undefined],
    ['v1.io/start.v2.md', undefined],
    ['xx/start.md', undefined],
    ['fr.md', undefined],
    ['dev-kit/start.md', undefined],
  ])('%s names %s', (path, language) => {
    expect(languageOfPath(path)).toBe(language);
  });

  test('counts below the folder alone', () => {
    const source = { uri: 'file:///home/it/docs/start.md', format: 'markdown', text: '' } as const;
    expect(withPathLanguage(source, 'file:///home/it/docs')).toBe(source);
    expect(withPathLanguage(source, 'file:///home/')).toEqual({ ...source, pathLanguage: 'it' });
    expect(withPathLanguage(source, 'file:///elsewhere')).toBe(source);
  });
});
