// HTML tags inside a paragraph: which vanish, which hide what they enclose, which put it into a zone.
import type { ContentBuilder } from '../content.js';
import { Zone, type ZoneSet } from '../zones.js';
import { attributeOf, componentTarget, componentZones, isLink } from './jsxProse.js';
import type { JsxTag } from './jsxTag.js';
import { effectOf, holdsCode } from './wrappers.js';

const NAME = /<\/?([A-Za-z][A-Za-z0-9-]*)/y;
const LANG = /\slang\s*=\s*["']?([A-Za-z]{2,3})\b/i;
const UNTRANSLATED = /\stranslate\s*=\s*["']?no\b/i;
const HREF = /\shref\s*=\s*(?:"([^"]*)"|'([^']*)'|([^\s"'=<>`]+))/i;

const VANISHING = new Set(
  'abbr b bdi bdo big center cite del dfn div em font i ins label li mark nobr ol p q s small span strike strong sub'
    .concat(' sup time u ul wbr td th tr summary details figure figcaption section a kbd')
    .split(' '),
);
const HIDING = new Set('code pre samp script style svg tt var math textarea'.split(' '));
const ZONES: Partial<Record<string, ZoneSet>> = { kbd: Zone.uiLabel, q: Zone.quotation, cite: Zone.quotation };

/** Words in another language than English, which most pages are in, are no words of the page's own. */
function foreignZone(tag: string): ZoneSet {
  const language = LANG.exec(tag)?.[1];
  return language === undefined || /^en$/i.test(language) ? 0 : Zone.quotation;
}

/** The HTML elements that are open while one block is read. */
export class InlineHtml {
  private zones: ZoneSet = 0;
  /** Names that nothing closes in the rest of the block. */
  private unclosed: Set<string> | undefined;
  /** Zones of the components opened last, by name. */
  private readonly opened = new Map<string, ZoneSet>();
  private anchor: { start: number; target: string } | undefined;

  constructor(
    private readonly text: string,
    private readonly out: ContentBuilder,
    private readonly end: number,
  ) {}

  /** Takes the tag `[from, to)` and returns where reading goes on: behind the tag or behind the element that it hides. */
  tag(from: number, to: number): number {
    NAME.lastIndex = from;
    const name = NAME.exec(this.text)?.[1]?.toLowerCase() ?? '';
    const closing = this.text.charCodeAt(from + 1) === 47;
    if (name === 'br') {
      this.out.space(from, to);
      return to;
    }
    if (!closing && (HIDING.has(name) || UNTRANSLATED.test(this.text.slice(from, to)))) {
      const end = this.elementEnd(name, to);
      this.out.opaque(from, end);
      return end;
    }
    if (!VANISHING.has(name)) {
      this.out.opaque(from, to);
      return to;
    }
    const zone = (ZONES[name] ?? 0) | (closing ? 0 : foreignZone(this.text.slice(from, to)));
    if (!closing && zone !== 0) this.opened.set(name, zone);
    const own = closing ? this.opened.get(name) : zone;
    if (closing) this.opened.delete(name);
    if (own !== undefined && own !== 0) this.switchZone(own, !closing);
    if (name === 'a') this.switchAnchor(closing ? undefined : targetOf(HREF.exec(this.text.slice(from, to))));
    return to;
  }

  /** Takes a tag of JSX, likewise. Names without a capital are those of HTML; of components, the children run on in the text. */
  jsx(tag: JsxTag, from: number): number {
    const { name, closes, isEmpty, end } = tag;
    if (!/^[A-Z]/.test(name) && !name.includes('.')) return name === '' ? end : this.tag(from, end);
    if (isEmpty || holdsCode(name)) {
      const to = isEmpty || closes ? end : this.elementEnd(name, end);
      this.out.opaque(from, to);
      return to;
    }
    // Children of neighbours are no one word.
    if (closes && this.text.charCodeAt(end) === 60) this.out.space(from, end);
    if (isLink(name)) this.switchAnchor(closes ? undefined : componentTarget(this.text, tag));
    const zones = componentZones(name) | (effectOf(name, (key) => attributeOf(this.text, tag, key), true)?.zones ?? 0);
    if (!closes) this.opened.set(name, zones);
    const own = this.opened.get(name) ?? 0;
    if (own !== 0) this.switchZone(own, !closes);
    return end;
  }

  /** Ends what is still open where the block ends. */
  close(): void {
    this.switchAnchor(undefined);
    this.out.setZones(this.out.currentZones & ~this.zones);
  }

  private switchZone(zone: ZoneSet, on: boolean): void {
    this.zones = on ? this.zones | zone : this.zones & ~zone;
    this.out.setZones(on ? this.out.currentZones | zone : this.out.currentZones & ~zone);
  }

  private switchAnchor(target: string | undefined): void {
    if (this.anchor) {
      this.out.link(this.anchor.start, this.anchor.target);
      this.anchor = undefined;
      this.switchZone(Zone.linkText, false);
    }
    if (target === undefined) return;
    this.switchZone(Zone.linkText, true);
    this.anchor = { start: this.out.length, target };
  }

  /** The end of the element whose opening tag ends at `from`; the tag's own end where nothing closes it in this block. */
  private elementEnd(name: string, from: number): number {
    if (this.unclosed?.has(name) === true) return from;
    const closing = new RegExp(`</${name}\\s*>`, 'gi');
    closing.lastIndex = from;
    const found = closing.exec(this.text.slice(0, this.end));
    if (found) return found.index + found[0].length;
    (this.unclosed ??= new Set()).add(name);
    return from;
  }
}

function targetOf(href: RegExpExecArray | null): string | undefined {
  return href ? (href[1] ?? href[2] ?? href[3] ?? '') : undefined;
}
