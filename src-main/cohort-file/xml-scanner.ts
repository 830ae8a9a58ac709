/** What is seen of an XML text, in order. Names come without their prefix, texts with entities replaced. */
export interface XmlSeer {
  open(name: string, attributes: string): void;
  close(name: string): void;
  text(text: string): void;
}

/**
 * Scans well-formed XML block by block, as it stands in the parts of a workbook: elements, texts, CDATA. Comments,
 * instructions and declarations are passed over; entities are the five of XML and character numbers.
 */
export class XmlScanner {
  private rest = '';

  constructor(private readonly seer: XmlSeer) {}

  write(block: string): void {
    const xml = this.rest === '' ? block : this.rest + block;
    let at = 0;
    for (;;) {
      const start = xml.indexOf('<', at);
      const end = start < 0 ? -1 : endOfMarkup(xml, start);
      if (end < 0) break;
      if (start > at) this.seer.text(withEntities(xml.slice(at, start)));
      this.markup(xml, start, end);
      at = end;
    }
    this.rest = xml.slice(at);
  }

  private markup(xml: string, start: number, end: number): void {
    const first = xml[start + 1];
    if (first === '?') return;
    if (first === '!') {
      if (xml.startsWith(CDATA, start)) this.seer.text(xml.slice(start + CDATA.length, end - 3));
      return;
    }
    if (first === '/') {
      this.seer.close(localName(xml.slice(start + 2, end - 1).trim()));
      return;
    }
    const empty = xml[end - 2] === '/';
    const content = xml.slice(start + 1, empty ? end - 2 : end - 1);
    const space = content.search(/\s/);
    const name = localName(space < 0 ? content : content.slice(0, space));
    this.seer.open(name, space < 0 ? '' : content.slice(space));
    if (empty) this.seer.close(name);
  }
}

const CDATA = '<![CDATA[';

/** Index after the markup that starts at `start`; −1 when it is not complete yet. */
function endOfMarkup(xml: string, start: number): number {
  if (xml[start + 1] === '!') {
    if (xml.length - start < CDATA.length) return -1;
    if (xml.startsWith(CDATA, start)) return after(xml.indexOf(']]>', start), 3);
    if (xml.startsWith('<!--', start)) return after(xml.indexOf('-->', start + 4), 3);
  }
  let end = xml.indexOf('>', start);
  while (end >= 0 && insideQuotes(xml, start, end)) end = xml.indexOf('>', end + 1);
  return after(end, 1);
}

function after(index: number, length: number): number {
  return index < 0 ? -1 : index + length;
}

function insideQuotes(xml: string, start: number, end: number): boolean {
  let quote = '';
  for (let index = start; index < end; index += 1) {
    const character = xml[index];
    if (quote === '') {
      if (character === '"' || character === "'") quote = character;
    } else if (character === quote) {
      quote = '';
    }
  }
  return quote !== '';
}

function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon < 0 ? name : name.slice(colon + 1);
}

const NAMED: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

function withEntities(text: string): string {
  if (!text.includes('&')) return text;
  return text.replace(/&(#x[0-9a-fA-F]+|#\d+|\w+);/g, (whole, entity: string) => {
    if (!entity.startsWith('#')) return NAMED[entity] ?? whole;
    const code = entity.startsWith('#x') ? parseInt(entity.slice(2), 16) : Number(entity.slice(1));
    return code <= 0x10ffff ? String.fromCodePoint(code) : whole;
  });
}

const PATTERNS = new Map<string, RegExp>();

/** The value of an attribute, found by its name without prefix; null when it is not there. */
export function attribute(attributes: string, name: string): string | null {
  let pattern = PATTERNS.get(name);
  if (pattern === undefined) {
    pattern = new RegExp(`\\s(?:[\\w.-]+:)?${name}\\s*=\\s*(?:"([^"]*)"|'([^']*)')`);
    PATTERNS.set(name, pattern);
  }
  const match = pattern.exec(attributes);
  return match === null ? null : withEntities(match[1] ?? match[2] ?? '');
}
