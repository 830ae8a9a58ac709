import { blocksIn, DEFAULT_BLOCKS, type BlockKind, type BookletBlock } from '../norms/booklet-blocks.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { blockBody, blockHeading } from './block-kinds.ts';
import type { BlockContext } from './block-pages.ts';
import type { BlockWords } from './block-words.ts';
import type { Block, Paper } from './booklet.ts';
import { blockFrame, bodyWidth, groupFrame, type PageFrame } from './page-frame.ts';
import { sheetPages } from './sheet-pages.ts';
import { tableName } from './sheet-texts.ts';
import { measureTables } from './table-measure.ts';

/** Pages that follow each other under one heading: a block, or the sheet of a group. */
export interface BookletPart {
  readonly block: BlockKind | null;
  /** Position of the group in the norm set, for its sheet. */
  readonly group: number | null;
  /** The heading under which it is found; null where there is none. */
  readonly name: string | null;
  readonly frame: PageFrame;
  readonly pages: readonly (readonly Block[])[];
}

export interface BookletParts {
  readonly parts: readonly BookletPart[];
  readonly remarks: readonly string[];
}

export interface PartsBasis {
  readonly normSet: NormSet;
  readonly paper: Paper;
  readonly words: BlockWords;
  readonly programVersion: string | null;
}

const NOTHING_CHOSEN = 'No block of the booklet is chosen; the tables are printed. Choose what is to be printed.';

/** The blocks that are printed, in print order: the tables where nothing is. */
function printedBlocks({ project }: NormSet): { readonly blocks: readonly BookletBlock[]; readonly remarks: string[] } {
  const blocks = blocksIn(project.sheet).filter(({ printed }) => printed);
  if (blocks.length > 0) return { blocks, remarks: [] };
  return { blocks: DEFAULT_BLOCKS.filter(({ printed }) => printed), remarks: [NOTHING_CHOSEN] };
}

/** The parts of the booklet in print order. */
export function bookletParts(basis: PartsBasis): BookletParts {
  const { normSet, words, paper, programVersion } = basis;
  const { blocks, remarks } = printedBlocks(normSet);
  const made = blocks.map((block): BookletParts => {
    const heading = blockHeading(block, normSet.project, words);
    switch (block.kind) {
      case 'tables':
        return tableParts(basis);
      case 'contents':
        return { parts: [], remarks: [] };
      default: {
        const frame = blockFrame(normSet, heading, paper);
        const context: BlockContext = { normSet, block, heading, frame, words, programVersion };
        const { pages, remarks } = blockBody(context);
        return { parts: [{ block: block.kind, group: null, name: heading, frame, pages }], remarks };
      }
    }
  });
  return {
    parts: made.flatMap(({ parts }) => parts).filter(({ pages }) => pages.length > 0),
    remarks: [...remarks, ...made.flatMap((each) => each.remarks)],
  };
}

function tableParts({ normSet, paper }: PartsBasis): BookletParts {
  const { measure, remarks } = measureTables(normSet, bodyWidth(paper));
  const sheets = normSet.groups.map((norms, group) => {
    const frame = groupFrame(normSet, group, norms, paper);
    return {
      group,
      name: tableName(normSet.project, group, norms),
      frame,
      ...sheetPages(normSet, group, frame, measure),
    };
  });
  return {
    parts: sheets.map(({ group, name, frame, pages }) => ({ block: 'tables', group, name, frame, pages })),
    remarks: [
      ...remarks,
      ...sheets
        .filter(({ shortened, frame }) => shortened || frame.shortened)
        .map(({ group }) => `The titles on table ${group + 1} are too long for the page and end in “…”. Shorten them.`),
    ],
  };
}
