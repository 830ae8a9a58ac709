import type { BookletPart, PlannedPart } from './booklet-parts.ts';
import { contentsPages, type ContentsEntry } from './contents-pages.ts';

/** Which page every part begins on, with the contents in their place. */
export function withContents(planned: readonly PlannedPart[]): readonly BookletPart[] {
  // Entries of the same names take the same room, whatever the pages.
  const rough = setIn(
    planned,
    entriesOf(planned, () => 0),
  );
  let next = 1;
  const firstPages = rough.map(({ pages }) => {
    const first = next;
    next += pages.length;
    return first;
  });
  return setIn(
    planned,
    entriesOf(planned, (place) => firstPages[place] ?? 0),
  );
}

function setIn(planned: readonly PlannedPart[], entries: readonly ContentsEntry[]): readonly BookletPart[] {
  return planned.map((part): BookletPart => {
    if (!('context' in part)) return part;
    const { context } = part;
    const { pages } = contentsPages(context, entries);
    return { block: 'contents', group: null, name: context.heading, under: null, frame: context.frame, pages };
  });
}

/** Headings of blocks, and the tables below theirs; the title page and the contents are not in the contents. */
function entriesOf(planned: readonly PlannedPart[], pageOf: (place: number) => number): readonly ContentsEntry[] {
  return planned.flatMap((part, place) => {
    if ('context' in part || part.name === null || part.block === 'title-page') return [];
    const page = pageOf(place);
    const first = part.under !== null && planned[place - 1]?.block !== 'tables';
    return [
      ...(first ? [{ name: part.under, page, within: false }] : []),
      { name: part.name, page, within: part.under !== null },
    ];
  });
}
