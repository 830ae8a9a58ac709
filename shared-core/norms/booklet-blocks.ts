/**
 * What a booklet can be made of, in the usual order. `tables` is a sheet for each group; `groups-across` one table with
 * the raw score down and the groups across; `inverse` the raw score that reaches each of some percentiles; `pictures`
 * ogives and box plots.
 */
export const BLOCK_KINDS = [
  'title-page',
  'contents',
  'norm-group',
  'how-to-read',
  'tables',
  'groups-across',
  'inverse',
  'cut-scores',
  'pictures',
  'technical-notes',
  'cautions',
  'change-list',
  'colophon',
] as const;

export type BlockKind = (typeof BLOCK_KINDS)[number];

/** One block as the user chose it; an empty heading or text stands for the standing one. */
export interface BookletBlock {
  readonly kind: BlockKind;
  readonly printed: boolean;
  readonly heading: string;
  readonly text: string;
}

function blocksPrinting(printed: (kind: BlockKind) => boolean): readonly BookletBlock[] {
  return BLOCK_KINDS.map((kind) => ({ kind, printed: printed(kind), heading: '', text: '' }));
}

/** The tables alone: a sheet for each group. */
export const DEFAULT_BLOCKS = blocksPrinting((kind) => kind === 'tables');

/** A whole booklet. */
export const WHOLE_BOOKLET = blocksPrinting(() => true);

/** All blocks in print order: those listed, and behind them those that a project does not know, not printed. */
export function blocksIn({ blocks }: { readonly blocks: readonly BookletBlock[] }): readonly BookletBlock[] {
  const listed = new Set(blocks.map(({ kind }) => kind));
  return [
    ...blocks,
    ...DEFAULT_BLOCKS.filter(({ kind }) => !listed.has(kind)).map((block) => ({ ...block, printed: false })),
  ];
}

/** Whether a block of the kind is printed. */
export function prints({ blocks }: { readonly blocks: readonly BookletBlock[] }, kind: BlockKind): boolean {
  return blocks.some((block) => block.kind === kind && block.printed);
}
