import { execFileSync } from 'node:child_process';
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

/** An element of the tree by which a PDF is read aloud. */
export interface ReadElement {
  readonly type: string;
  readonly title: string;
  readonly alt: string;
  readonly actual: string;
  readonly scope: string;
  readonly children: readonly (ReadElement | string)[];
}

export interface ReadStructure {
  readonly root: ReadElement;
  /** Texts that are marked as no part of the document, page by page. */
  readonly artifacts: readonly (readonly string[])[];
  /** Texts that stand in no mark at all. */
  readonly loose: readonly string[];
  /** What is wrong between the tree, the marks of the pages and the tree of parents. */
  readonly faults: readonly string[];
  readonly catalogue: Values;
  readonly pages: readonly Values[];
}

type Value = string | number | boolean | null | readonly Value[] | Values;
interface Values {
  readonly [key: string]: Value | undefined;
}

function isValues(value: Value | undefined): value is Values {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** The objects of a PDF as qpdf lists them. */
class PdfObjects {
  readonly #byName: ReadonlyMap<string, Value>;

  constructor(file: string) {
    const listed = JSON.parse(
      execFileSync('qpdf', ['--json=2', '--json-key=qpdf', file, '-'], { encoding: 'utf8', maxBuffer: 2 ** 28 }),
    ) as { readonly qpdf: readonly [unknown, Readonly<Record<string, { value?: Value; stream?: { dict: Value } }>>] };
    this.#byName = new Map(
      Object.entries(listed.qpdf[1]).map(([name, { value, stream }]) => [
        name.replace(/^obj:/, ''),
        value ?? stream?.dict ?? null,
      ]),
    );
  }

  /** The value, looked up where it is a reference. */
  of(value: Value | undefined): Value {
    if (typeof value === 'string' && /^\d+ 0 R$/.test(value)) return this.of(this.#byName.get(value));
    return value ?? null;
  }

  values(value: Value | undefined): Values {
    const found = this.of(value);
    if (!isValues(found)) throw new Error(`not a dictionary: ${JSON.stringify(value)}`);
    return found;
  }

  list(value: Value | undefined): readonly Value[] {
    const found = this.of(value);
    return Array.isArray(found) ? (found as readonly Value[]) : found === null ? [] : [found];
  }

  /** The reference itself. */
  name(value: Value | undefined): string {
    return typeof value === 'string' ? value : 'no reference';
  }

  text(value: Value | undefined): string {
    const found = this.of(value);
    return typeof found === 'string' ? found.replace(/^[ub]:|^\//, '') : '';
  }

  get catalogue(): Values {
    return this.values(this.values(this.#byName.get('trailer'))['/Root']);
  }
}

interface MarkedTexts {
  readonly byMark: ReadonlyMap<string, string>;
  readonly artifacts: readonly string[];
  readonly loose: readonly string[];
}

/** Reads the file by its structure tree alone, as a screen reader does. */
export async function readStructure(file: string, bytes: Uint8Array): Promise<ReadStructure> {
  const objects = new PdfObjects(file);
  const { catalogue } = objects;
  const pageNames = objects.list(objects.values(catalogue['/Pages'])['/Kids']).map(String);
  const pages = pageNames.map((name) => objects.values(name));
  const marked = await markedTexts(bytes);
  const treeRoot = objects.values(catalogue['/StructTreeRoot']);
  const parents = parentTree(objects, objects.values(treeRoot['/ParentTree']));
  const faults: string[] = [];
  const met = new Set<string>();

  const content = (page: string, mark: number, owner: string): string => {
    const at = pageNames.indexOf(page);
    const key = `${at} ${mark}`;
    if (met.has(key)) faults.push(`mark ${mark} of page ${at + 1} stands twice in the tree`);
    met.add(key);
    const text = marked[at]?.byMark.get(String(mark));
    if (text === undefined) faults.push(`page ${at + 1} has no mark ${mark}`);
    const parent = objects.list(parents.get(Number(pages[at]?.['/StructParents'])))[mark];
    if (parent !== owner)
      faults.push(`mark ${mark} of page ${at + 1} belongs to ${owner}, not to ${objects.name(parent)}`);
    return text ?? '';
  };

  const element = (name: string, parent: string): ReadElement => {
    const facts = objects.values(name);
    if (facts['/P'] !== parent) faults.push(`${name} stands under ${parent}, not under ${objects.name(facts['/P'])}`);
    const children = objects.list(facts['/K']).map((kid): ReadElement | string => {
      if (typeof kid === 'number') return content(objects.name(facts['/Pg']), kid, name);
      if (isValues(kid)) return content(objects.name(kid['/Pg']), Number(kid['/MCID']), name);
      return element(objects.name(kid), name);
    });
    const attributes = objects.of(facts['/A']);
    return {
      type: objects.text(facts['/S']),
      title: objects.text(facts['/T']),
      alt: objects.text(facts['/Alt']),
      actual: objects.text(facts['/ActualText']),
      scope: isValues(attributes) ? objects.text(attributes['/Scope']) : '',
      children,
    };
  };

  const [rootName, ...others] = objects.list(treeRoot['/K']);
  if (others.length > 0) faults.push('more than one root');
  const root = element(objects.name(rootName), objects.name(catalogue['/StructTreeRoot']));
  marked.forEach(({ byMark }, at) => {
    for (const mark of byMark.keys())
      if (!met.has(`${at} ${mark}`)) faults.push(`mark ${mark} of page ${at + 1} is lost`);
  });
  return {
    root,
    artifacts: marked.map(({ artifacts }) => artifacts),
    loose: marked.flatMap(({ loose }) => loose),
    faults,
    catalogue,
    pages,
  };
}

function parentTree(objects: PdfObjects, tree: Values): ReadonlyMap<number, Value> {
  const numbers = objects.list(tree['/Nums']);
  const pairs = new Map<number, Value>();
  for (let at = 0; at < numbers.length; at += 2) pairs.set(Number(numbers[at]), numbers[at + 1] ?? null);
  for (const kid of objects.list(tree['/Kids'])) {
    for (const [key, value] of parentTree(objects, objects.values(kid))) pairs.set(key, value);
  }
  return pairs;
}

/** The texts of each page under the numbers of their marks. */
async function markedTexts(bytes: Uint8Array): Promise<readonly MarkedTexts[]> {
  const task = getDocument({ data: bytes.slice(), isEvalSupported: false, verbosity: 0 });
  const document = await task.promise;
  const pages: MarkedTexts[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const { items } = await (await document.getPage(number)).getTextContent({ includeMarkedContent: true });
    const byMark = new Map<string, string>();
    const [artifacts, loose]: [string[], string[]] = [[], []];
    const open: (string | null)[] = [];
    for (const item of items) {
      if ('str' in item) {
        const [mark] = open.slice(-1);
        if (mark === undefined) loose.push(item.str);
        else if (mark === null) artifacts.push(item.str);
        // Spaces between texts are this program's guess from where the texts stand.
        else byMark.set(mark, `${byMark.get(mark) ?? ''}${item.str}${item.hasEOL ? ' ' : ''}`);
      } else if (item.type === 'endMarkedContent') {
        open.pop();
      } else {
        // Without a number it is the mark of an artifact.
        const mark = /_mc(\d+)$/.exec(item.id)?.[1] ?? null;
        open.push(mark);
        if (mark !== null) byMark.set(mark, '');
      }
    }
    const printed = (texts: readonly string[]): string[] => texts.filter((text) => text.trim() !== '');
    for (const [mark, text] of byMark) byMark.set(mark, text.replace(/ +/g, ' ').replace(/^ | $/g, ''));
    pages.push({ byMark, artifacts: printed(artifacts), loose: printed(loose) });
  }
  await task.destroy();
  return pages;
}
