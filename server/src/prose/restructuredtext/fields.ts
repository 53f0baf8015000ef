// Field lists: whether a field's body is prose, by the field's name.

/** Fields that say who, when and which, or hold types. The first are docutils' bibliographic fields. */
const DATA = new Set(
  [
    'author authors organization contact address version status date copyright revision release',
    'orphan tocdepth nocomments nosearch no-search og',
    'type rtype vartype raises-type module sectionauthor codeauthor license licence maintainer email url',
  ].flatMap((names) => names.split(' ')),
);

/** True where the body of a field is read. */
export function readFieldBody(name: string): boolean {
  const first = /^[^\s:]{1,40}/.exec(name)?.[0].toLowerCase();
  return first !== undefined && !DATA.has(first);
}
