// A start tag's attributes by their places, and the role of the element that it starts.
import { ADMONITION_CLASSES, HTML, LABEL_CLASSES, SAFETY_CLASSES } from './htmlElements.js';
import { writtenTag } from '../../text/language.js';
import { Zone, type ZoneSet } from '../zones.js';
import { CLOSED, CONTAINER, Flow, INLINE, OPAQUE_INLINE, type ElementRole, type Vocabulary } from './roles.js';

/** The tag of a language that is not known (BCP 47); so HTML and XML mean an empty one. */
export const UNDETERMINED = 'und';
/** Words in the names of custom elements that hold code; those of the second kind are displayed. */
const CODE_ELEMENT = /(?:^|-)(?:code|pre|codeblock|snippet|highlight|terminal|console|playground|syntax)(?:-|$)/;
const CODE_DISPLAY =
  /block|snippet|example|sample|listing|editor|terminal|console|playground|highlight|tab|group|pre\b/;
const GLOSSARY = /(?:^|\s)glossary(?:\s|$)/i;
const SAFETY = /^(?:danger|warning|caution|notice)$/i;

/** A start tag while it is read; used again for the next. */
export class StartTag {
  /** As its end tag gives it: in HTML in lower case. */
  name = '';
  start = 0;
  private readonly names: string[] = [];
  private readonly values: number[] = [];

  constructor(
    private readonly text: string,
    private readonly xml: boolean,
  ) {}

  begin(from: number, to: number): void {
    const name = this.text.slice(from, to);
    this.name = this.xml ? name : name.toLowerCase();
    this.start = from - 1;
    this.names.length = 0;
    this.values.length = 0;
  }

  addName(from: number, to: number): void {
    const name = this.text.slice(from, to);
    this.names.push(this.xml ? name : name.toLowerCase());
    this.values.push(to, to);
  }

  addValue(from: number, to: number): void {
    this.values[this.values.length - 2] = from;
    this.values[this.values.length - 1] = to;
  }

  /** The tag as it is now, to be kept. */
  copy(): { readonly name: string; attribute(name: string): string | undefined } {
    const values = new Map(this.names.map((name) => [name, this.attribute(name)]));
    return { name: this.name, attribute: (name) => values.get(name) };
  }

  /** The attribute's value as written, or undefined. */
  attribute(name: string): string | undefined {
    const i = this.names.indexOf(name);
    return i < 0 ? undefined : this.text.slice(this.values[2 * i], this.values[2 * i + 1]);
  }

  /** Every attribute with the place of its value. */
  forEach(visit: (name: string, from: number, to: number) => void): void {
    for (let i = 0; i < this.names.length; i++) visit(this.names[i]!, this.values[2 * i]!, this.values[2 * i + 1]!);
  }

  /** Zones that the attributes put the element into. */
  zones(role: ElementRole, vocabulary: Vocabulary): ZoneSet {
    if (this.names.length === 0) return 0;
    if (role.safetyBy !== undefined) return SAFETY.test(this.attribute(role.safetyBy) ?? '') ? Zone.safetyMessage : 0;
    if (vocabulary !== HTML || role.flow > Flow.inline) return 0;
    const written = this.attribute('class');
    if (written === undefined) return 0;
    const classes = written.toLowerCase().split(/\s+/);
    if (role.flow === Flow.inline) return classes.some((word) => LABEL_CLASSES.has(word)) ? Zone.uiLabel : 0;
    const isNotice = classes.includes('notice') && classes.some((word) => ADMONITION_CLASSES.has(word));
    return isNotice || classes.some((word) => SAFETY_CLASSES.has(word)) ? Zone.safetyMessage : 0;
  }

  /** The language that the element states, as a BCP 47 tag, or undefined. */
  language(): string | undefined {
    if (this.names.length === 0) return undefined;
    const written = this.attribute('xml:lang') ?? this.attribute('lang');
    if (written === undefined) return undefined;
    return written.trim() === '' ? UNDETERMINED : writtenTag(written);
  }

  /** True where the element is not to be translated (HTML; ITS 2.0, section 8.1), such as a name: no prose of ours. */
  isUntranslated(vocabulary: Vocabulary): boolean {
    if (this.names.length === 0) return false;
    const translate = this.attribute('translate') ?? this.attribute('its:translate');
    if (translate !== undefined) return translate.toLowerCase() === 'no';
    return vocabulary === HTML && /(?:^|\s)notranslate(?:\s|$)/.test(this.attribute('class') ?? '');
  }

  /** True where attributes say that the element is a glossary (DPUB-ARIA 1.1, `doc-glossary`; else common practice). */
  isGlossary(): boolean {
    return this.names.some((name) => {
      if (name === 'role') return this.attribute('role') === 'doc-glossary';
      return (name === 'class' || name === 'id') && GLOSSARY.test(this.attribute(name)!);
    });
  }

  /** True where the element's text may come from elsewhere (DITA 1.3, content references and keys). */
  isReused(): boolean {
    return this.names.some((name) => name === 'keyref' || name === 'conref' || name === 'conkeyref');
  }

  /** The target, where the element is a link. */
  target(role: ElementRole): string | undefined {
    for (const name of role.targets ?? []) {
      const target = this.attribute(name);
      if (target !== undefined) return target;
    }
    return undefined;
  }
}

/** The role of an element by its local name; undefined for an unknown one that takes no text of its own. */
export function roleOf(
  vocabulary: Vocabulary,
  parent: { readonly name: string; readonly takesText: boolean },
  name: string,
): ElementRole {
  const { elements, dependent } = vocabulary;
  if (dependent.has(name)) {
    const role = elements.get(`${parent.name.slice(parent.name.indexOf(':') + 1)}>${name}`);
    if (role) return role;
  }
  if (vocabulary === HTML && CODE_ELEMENT.test(name) && !elements.has(name))
    return CODE_DISPLAY.test(name) ? CLOSED : OPAQUE_INLINE;
  return elements.get(name) ?? (vocabulary.unknown === 'inline' || parent.takesText ? INLINE : CONTAINER);
}
