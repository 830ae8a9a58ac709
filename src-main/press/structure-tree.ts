import type { Picture } from '../../shared-core/pages/booklet.ts';
import type { CellRole, PageRole, ProseRole, TextRole } from '../../shared-core/pages/text-role.ts';

type Element = PDFKit.PDFStructureElement;

/** What an element of the tree says of itself; scope and bounds are not among the published types. */
interface ElementFacts {
  readonly title?: string;
  readonly alt?: string;
  readonly actual?: string;
  readonly scope?: 'Row' | 'Column';
  /** Left, top, right and bottom in points from the top left corner of the page. */
  readonly bbox?: readonly [number, number, number, number];
}

/** What is drawn together: texts of one role, a picture, or a rule, which is read by nobody. */
export type DrawnPart = TextRole | Picture | { readonly kind: 'rule' };

/**
 * The tree by which a PDF is read aloud (PDF 1.7, ISO 32000-1, 14.7 and 14.8): the document, a section for each sheet,
 * and in it headings, paragraphs, tables and figures in the order in which they are first drawn. An element goes on over
 * columns and pages for as long as its sheet does.
 */
export class StructureTree {
  readonly #document: PDFKit.PDFDocument;
  readonly #root: Element;
  #sheet: Element | null = null;
  /** Elements of the sheet by their places in it. */
  readonly #elements = new Map<string, Element>();

  constructor(document: PDFKit.PDFDocument) {
    this.#document = document;
    this.#root = document.struct('Document');
    document.addStructure(this.#root);
  }

  /** Begins the section of a sheet, whose title is not printed here. */
  openSheet(title: string): void {
    this.closeSheet();
    this.#sheet = this.#child(this.#root, 'Sect', { title });
  }

  /** What was read so far is written; nothing can be added to the sheet any more. */
  closeSheet(): void {
    this.#sheet?.end();
    this.#sheet = null;
    this.#elements.clear();
  }

  /** Whatever `draw` draws on the current page belongs to the part. */
  mark(part: DrawnPart, draw: () => void): void {
    switch (part.kind) {
      case 'running':
      case 'repeated':
      case 'rule':
        this.#document.markContent('Artifact', artifactOptions(part));
        draw();
        this.#document.endMarkedContent();
        return;
      case 'picture': {
        const { x, y, width, height, alt } = part;
        const figure = this.#child(this.#openSection(), 'Figure', { alt, bbox: [x, y, x + width, y + height] });
        this.#fill(figure, 'Figure', draw);
        return;
      }
      case 'heading':
      case 'paragraph': {
        const type = proseType(part);
        this.#fill(this.#within(this.#openSection(), part.name, type), type, draw);
        return;
      }
      case 'cell':
        this.#markCell(part, draw);
        return;
    }
  }

  #openSection(): Element {
    if (this.#sheet === null) throw new Error('text of a sheet that was not opened');
    return this.#sheet;
  }

  #markCell({ table, row, column, headOf, said }: CellRole, draw: () => void): void {
    const group = row === 'head' ? 'THead' : 'TBody';
    const type = headOf === null ? 'TD' : 'TH';
    const scope = headOf === null ? {} : ({ scope: headOf === 'row' ? 'Row' : 'Column' } as const);
    const whole = this.#within(this.#openSection(), `table ${table}`, 'Table');
    const rows = this.#within(whole, `table ${table} ${group}`, group);
    const line = this.#within(rows, `table ${table} ${row}`, 'TR');
    const place = `table ${table} ${row} ${column}`;
    const cell = this.#within(line, place, type, scope);
    if (said === null) this.#fill(cell, type, draw);
    else this.#fill(this.#within(cell, `${place} said`, 'Span', { actual: said }), 'Span', draw);
  }

  /** The element at a place of the sheet, made where there is none yet. */
  #within(parent: Element, place: string, type: string, facts: ElementFacts = {}): Element {
    const known = this.#elements.get(place);
    if (known !== undefined) return known;
    const made = this.#child(parent, type, facts);
    this.#elements.set(place, made);
    return made;
  }

  #child(parent: Element, type: string, facts: ElementFacts): Element {
    const child = this.#document.struct(type, facts);
    parent.add(child);
    return child;
  }

  #fill(element: Element, type: string, draw: () => void): void {
    const content = this.#document.markStructureContent(type);
    draw();
    this.#document.endMarkedContent();
    element.add(content);
  }
}

/** Parts of equal place follow each other in one mark. */
export function placeOf(part: DrawnPart): string {
  switch (part.kind) {
    case 'running':
      return `running ${part.edge}`;
    case 'repeated':
    case 'rule':
      return part.kind;
    case 'picture':
      return `picture ${part.x} ${part.y}`;
    case 'heading':
    case 'paragraph':
      return `prose ${part.name}`;
    case 'cell':
      return `cell ${part.table} ${part.row} ${part.column}`;
  }
}

function proseType(role: ProseRole): string {
  return role.kind === 'heading' ? `H${role.level}` : 'P';
}

function artifactOptions(part: PageRole | { readonly kind: 'rule' }): PDFKit.Mixins.MarkingOptions {
  switch (part.kind) {
    case 'running':
      return { type: 'Pagination', attached: [part.edge === 'top' ? 'Top' : 'Bottom'] };
    case 'repeated':
      return { type: 'Pagination' };
    case 'rule':
      return { type: 'Layout' };
  }
}
