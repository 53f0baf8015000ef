// Files in other encodings than UTF-8: read where their encoding is certain, refused with a reason where it is not.
import { describe, expect, it } from 'vitest';
import { decode } from '../../../server/src/node/decoding.js';

const GERMAN =
  'Die Größe der Boje hängt von der Strömung ab. Für jede Boje gibt es einen Schlüssel. Prüfen Sie die Batterie, bevor Sie ' +
  'die Boje aussetzen, und öffnen Sie das Gehäuse nicht auf See.\n';
const RUSSIAN =
  'Размер буя зависит от течения. Якорная цепь должна быть длиннее глубины воды. Для каждого буя есть ключ. Проверьте батарею.\n';

/** Windows code page 1251: the letters А to я stand at C0 to FF (Unicode Consortium, CP1251.TXT, from memory). */
function cyrillic(text: string): Buffer {
  return Buffer.from(
    Array.from(text, (letter) => {
      const code = letter.codePointAt(0)!;
      return code < 128 ? code : code - 0x410 + 0xc0;
    }),
  );
}

describe('decoding', () => {
  it('takes UTF-8 as it is, its mark included, so that offsets stay those of an editor', () => {
    expect(decode(Buffer.from(`\uFEFF${GERMAN}🌊`))).toEqual({ text: `\uFEFF${GERMAN}🌊` });
  });

  it('takes UTF-16 in either order by its mark', () => {
    const little = Buffer.from(`\uFEFF${GERMAN}🌊`, 'utf16le');
    expect(decode(little)).toEqual({ text: `${GERMAN}🌊` });
    expect(decode(Buffer.from(little).swap16())).toEqual({ text: `${GERMAN}🌊` });
    expect(decode(little.subarray(0, -1))).toEqual({ reason: 'is in UTF-16, but damaged' });
  });

  it('tells Latin-1 and code page 1251 by their letters', () => {
    expect(decode(Buffer.from(GERMAN, 'latin1'))).toEqual({ text: GERMAN });
    expect(decode(cyrillic(RUSSIAN))).toEqual({ text: RUSSIAN });
    // 93 and 94 are quotation marks where Windows extends Latin-1 (WHATWG Encoding Standard, label “latin1”).
    expect(decode(Buffer.from(`\u0093${GERMAN}\u0094`, 'latin1'))).toEqual({ text: `“${GERMAN}”` });
  });

  it('refuses what it cannot tell, naming the line', () => {
    const noise = Buffer.concat([Buffer.from('One line.\n'), Buffer.from([0xff, 0x81, 0xfe, 0x8d, 0x9d, 0xc3, 0x28])]);
    expect(decode(noise)).toEqual({
      reason: 'is not in UTF-8 (line 2) and its encoding cannot be told; save it as UTF-8 to have it read',
    });
    expect(decode(Buffer.from('no mark', 'utf16le'))).toEqual({
      reason: 'is a binary file, or UTF-16 without its mark',
    });
  });
});
