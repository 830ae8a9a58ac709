import type { PrintWords } from '../languages/phrases.ts';
import { blocksIn, DEFAULT_BLOCKS, type BlockKind, type BookletBlock } from '../norms/booklet-blocks.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { blockHeading } from './block-heading.ts';
import { blockBody } from './block-kinds.ts';
import { openBlock, ownText } from './block-opening.ts';
import type { BlockContext } from './block-pages.ts';
import { layText } from './block-text.ts';
import type { Block, Paper } from './booklet.ts';
import { blockFrame, bodyWidth, groupFrame, type PageFrame } from './page-frame.ts';
import { sheetPages } from './sheet-pages.ts';
import { tableName } from './sheet-texts.ts';
import { measureTables } from './table-measure.ts';

/** Pages that follow each other under one heading: a block, or the sheet of a group. */
export interface BookletPart {
  /** Null for pages left blank. */
  readonly block: BlockKind | null;
  /** Position of the group in the norm set, for its sheet. */
  readonly group: number | null;
  /** The heading under which it is found; null where there is none. */
  readonly name: string | null;
  /** The heading of all tables, for the sheet of a group. */
  readonly under: string | null;
  readonly frame: PageFrame;
  readonly pages: readonly (readonly Block[])[];
}

/** A part, or the place of the contents, which are made when all other parts are. */
export type PlannedPart = BookletPart | { readonly block: 'contents'; readonly context: BlockContext };

export interface PlannedParts {
  readonly parts: readonly PlannedPart[];
  readonly remarks: readonly string[];
}

export interface PartsBasis {
  readonly normSet: NormSet;
  readonly paper: Paper;
  readonly words: PrintWords;
  readonly programVersion: string | null;
}

const NOTHING_CHOSEN = 'No block of the booklet is chosen; the tables are printed. Choose what is to be printed.';

/** The parts of the booklet in print order. */
export function plannedParts(basis: PartsBasis): PlannedParts {
  const { blocks, remarks } = printedBlocks(basis.normSet);
  const made = blocks.map((block) => partsOf(block, basis));
  return { parts: made.flatMap(({ parts }) => parts), remarks: [...remarks, ...made.flatMap((each) => each.remarks)] };
}

/** The blocks that are printed, in print order: the tables where nothing is. */
function printedBlocks({ project }: NormSet): {
  readonly blocks: readonly BookletBlock[];
  readonly remarks: readonly string[];
} {
  const blocks = blocksIn(project.sheet).filter(({ printed }) => printed);
  if (blocks.length > 0) return { blocks, remarks: [] };
  return { blocks: DEFAULT_BLOCKS.filter(({ printed }) => printed), remarks: [NOTHING_CHOSEN] };
}

function partsOf(block: BookletBlock, basis: PartsBasis): PlannedParts {
  const context = contextOf(block, basis);
  const { kind } = block;
  switch (kind) {
    case 'contents':
      return { parts: [{ block: kind, context }], remarks: [] };
    case 'tables': {
      const tables = tableParts(basis, context.heading);
      return { parts: [...openingPart(context), ...tables.parts], remarks: tables.remarks };
    }
    default: {
      const { frame, heading } = context;
      const { pages, remarks } = blockBody(context);
      if (pages.length === 0) return { parts: [], remarks };
      return { parts: [{ block: kind, group: null, name: heading, under: null, frame, pages }], remarks };
    }
  }
}

function contextOf(block: BookletBlock, { normSet, paper, words, programVersion }: PartsBasis): BlockContext {
  const heading = blockHeading(block, normSet.project, words);
  // The title stands on its page already, and at the left of the head.
  const frame = blockFrame(normSet, block.kind === 'title-page' ? '' : heading, paper);
  return { normSet, block, heading, frame, words, programVersion };
}

/** The page with what the user wrote above the tables; none where nothing was written. */
function openingPart(context: BlockContext): readonly BookletPart[] {
  const text = ownText(context.block);
  if (text.length === 0) return [];
  const { heading, frame } = context;
  const flow = openBlock(context);
  layText(flow, 'own', text);
  return [{ block: 'tables', group: null, name: heading, under: null, frame, pages: flow.pages }];
}

function tableParts(
  { normSet, paper }: PartsBasis,
  under: string,
): {
  readonly parts: readonly BookletPart[];
  readonly remarks: readonly string[];
} {
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
    parts: sheets.map(({ group, name, frame, pages }) => ({ block: 'tables', group, name, under, frame, pages })),
    remarks: [
      ...remarks,
      ...sheets
        .filter(({ shortened, frame }) => shortened || frame.shortened)
        .map(({ group }) => `The titles on table ${group + 1} are too long for the page and end in “…”. Shorten them.`),
    ],
  };
}
