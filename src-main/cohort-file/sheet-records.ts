import { booleanText, dateText, numberText, type CellStyleFacts } from './cell-text.ts';
import { attribute, type XmlSeer } from './xml-scanner.ts';

export interface SheetFacts extends CellStyleFacts {
  readonly sharedTexts: readonly string[];
  /** By style number: whether numbers of that style are dates. */
  readonly dateStyles: readonly boolean[];
}

/** Collects texts of a `si` or `is` element: all runs joined, reading aids (phonetic runs) left out. */
export class RichText {
  text = '';
  private inText = false;
  private inAid = false;

  open(name: string): void {
    if (name === 'rPh') this.inAid = true;
    else if (name === 't') this.inText = true;
  }

  close(name: string): void {
    if (name === 'rPh') this.inAid = false;
    else if (name === 't') this.inText = false;
  }

  add(text: string): void {
    if (this.inText && !this.inAid) this.text += text;
  }

  take(): string {
    const text = unescaped(this.text);
    this.text = '';
    return text;
  }
}

/** Workbooks write control characters of texts as _x000D_. */
function unescaped(text: string): string {
  return text.includes('_x')
    ? text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)))
    : text;
}

/**
 * Turns the XML of a worksheet into records of texts. Rows that the sheet skips come as blank records, so that records
 * keep the sheet's row numbers; blank rows below the last one that holds something are not handed on.
 */
export class SheetRecords implements XmlSeer {
  /** Records complete and not taken yet. */
  records: string[][] = [];
  private row = 0;
  private handedOn = 0;
  private cells: string[] = [];
  private column = -1;
  private type = '';
  private style = 0;
  private value = '';
  private inValue = false;
  private readonly rich = new RichText();

  constructor(private readonly facts: SheetFacts) {}

  open(name: string, attributes: string): void {
    if (name === 'row') {
      this.row = Number(attribute(attributes, 'r') ?? this.row + 1);
      this.cells = [];
      this.column = -1;
    } else if (name === 'c') {
      const reference = attribute(attributes, 'r');
      this.column = reference === null ? this.column + 1 : columnOf(reference);
      this.type = attribute(attributes, 't') ?? 'n';
      this.style = Number(attribute(attributes, 's') ?? 0);
      this.value = '';
    } else if (name === 'v') {
      this.inValue = true;
    } else {
      this.rich.open(name);
    }
  }

  text(text: string): void {
    if (this.inValue) this.value += text;
    else this.rich.add(text);
  }

  close(name: string): void {
    if (name === 'v') this.inValue = false;
    else if (name === 'c') this.endCell();
    else if (name === 'row') this.endRow();
    else this.rich.close(name);
  }

  /** The complete records, which are then forgotten here. */
  take(): readonly (readonly string[])[] {
    const taken = this.records;
    this.records = [];
    return taken;
  }

  private endCell(): void {
    const inline = this.rich.take();
    const text = this.type === 'inlineStr' ? inline : this.valueText();
    while (this.cells.length < this.column) this.cells.push('');
    this.cells[this.column] = text;
  }

  private valueText(): string {
    const { facts, value } = this;
    if (value === '') return '';
    switch (this.type) {
      case 's':
        return facts.sharedTexts[Number(value)] ?? '';
      case 'b':
        return booleanText(value.trim() === '1' || value.trim() === 'true');
      case 'd':
        return value.trim().replace(/T00:00:00(\.0+)?Z?$/, '');
      case 'n': {
        const number = Number(value);
        if (Number.isNaN(number)) return value;
        return facts.dateStyles[this.style] === true ? dateText(number, facts) : numberText(number, facts.mark);
      }
      default:
        return unescaped(value);
    }
  }

  private endRow(): void {
    while (this.cells.length > 0 && (this.cells.at(-1) ?? '').trim() === '') this.cells.pop();
    if (this.cells.length === 0) return;
    for (let missed = this.handedOn + 1; missed < this.row; missed += 1) this.records.push(['']);
    this.records.push(this.cells);
    this.handedOn = Math.max(this.row, this.handedOn + 1);
  }
}

/** Position of a column from a cell reference: A1 is 0, AA7 is 26. */
function columnOf(reference: string): number {
  let column = 0;
  for (let index = 0; index < reference.length; index += 1) {
    const letter = reference.charCodeAt(index) - 64;
    if (letter < 1 || letter > 26) break;
    column = column * 26 + letter;
  }
  return column - 1;
}
