// The lists of the package stopword, one a language, under ISO 639-3 codes; it ships no types of its own.
declare module 'stopword' {
  export const afr: string[], ara: string[], ben: string[], bul: string[], cat: string[], ces: string[], dan: string[];
  export const deu: string[], ell: string[], est: string[], eus: string[], fas: string[], fin: string[], fra: string[];
  export const gle: string[], glg: string[], guj: string[], heb: string[], hin: string[], hrv: string[], hun: string[];
  export const hye: string[], ind: string[], ita: string[], jpn: string[], kor: string[], lav: string[], lit: string[];
  export const mar: string[], msa: string[], mya: string[], nld: string[], nob: string[], panGu: string[];
  export const pol: string[], por: string[], ron: string[], rus: string[], slk: string[], slv: string[], spa: string[];
  export const swa: string[], swe: string[], tha: string[], tgl: string[], tur: string[], ukr: string[], urd: string[];
  export const vie: string[], zho: string[];
}
