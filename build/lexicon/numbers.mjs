// Whole numbers as three printable characters of base 85, free of what template strings and separators need.

const first = '%'.charCodeAt(0);
const skipped = ['\\', '`'].map((character) => character.charCodeAt(0));

/** The 85 digits, in rising order of code. */
export const digits = Array.from({ length: 126 - first + 1 }, (_, i) => first + i)
  .filter((code) => !skipped.includes(code))
  .slice(0, 85)
  .map((code) => String.fromCharCode(code))
  .join('');

/** Three digits for a number below 85³, the most significant first. */
export function encodeNumber(number) {
  if (!Number.isInteger(number) || number < 0 || number >= 85 ** 3) throw new RangeError(`${number} does not fit`);
  return digits[Math.floor(number / 7225)] + digits[Math.floor(number / 85) % 85] + digits[number % 85];
}
