import type { Block, Booklet, BookletPage, Picture, TextLine } from '../../../shared-core/pages/booklet.ts';
import { linesOn, textOf, widthOf } from './placed-laws.ts';

const TRACE = 0.05;

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** The ground that the letters of a line stand on. */
function boxOf(line: TextLine): Box {
  const width = widthOf(line);
  const left = line.align === 'left' ? line.x : line.x + line.width - width;
  return {
    left,
    right: left + width,
    top: line.baseline - 0.72 * line.size,
    bottom: line.baseline + 0.2 * line.size,
  };
}

const boxOfPicture = ({ x, y, width, height }: Picture): Box => ({
  left: x,
  right: x + width,
  top: y,
  bottom: y + height,
});

function touch(one: Box, other: Box): boolean {
  return (
    one.left < other.right - TRACE &&
    other.left < one.right - TRACE &&
    one.top < other.bottom - TRACE &&
    other.top < one.bottom - TRACE
  );
}

const picturesOn = (page: BookletPage): readonly Picture[] => page.blocks.filter((block) => block.kind === 'picture');

/** Lines of text that stand on each other or on a picture, and whatever of the body reaches into head or foot. */
export function overlaps({ pages }: Booklet): readonly string[] {
  return pages.flatMap((page) => {
    const lines = linesOn(page).map((line) => ({ line, box: boxOf(line) }));
    const pictures = picturesOn(page).map(boxOfPicture);
    const [head, foot] = page.blocks.flatMap((block) => (block.kind === 'rule' ? [block.y] : []));
    const outside = ({ top, bottom }: Box): boolean => top < (head ?? 0) - TRACE || bottom > (foot ?? 0) + TRACE;
    const body = [...lines.filter(({ line }) => line.role.kind !== 'running').map(({ box }) => box), ...pictures];
    return [
      ...lines.flatMap(({ line, box }, index) =>
        lines
          .slice(index + 1)
          .filter((other) => touch(box, other.box))
          .map((other) => `“${textOf(line)}” on “${textOf(other.line)}”`),
      ),
      ...lines.filter(({ box }) => pictures.some((picture) => touch(picture, box))).map(({ line }) => textOf(line)),
      ...body.filter(outside).map(() => 'out of the body'),
    ].map((fault) => `page ${page.number}: ${fault}`);
  });
}

/** What follows a heading: lines by where they stand, and pictures, which count as two lines. */
interface Following {
  readonly page: number;
  readonly heading: string;
  readonly isHeading: boolean;
  readonly place: string;
  readonly weight: number;
}

function bodyOf(page: BookletPage): readonly Following[] {
  const told = (block: Block): readonly Following[] => {
    if (block.kind === 'picture') {
      return [{ page: page.number, heading: '', isHeading: false, place: `picture ${block.y}`, weight: 2 }];
    }
    return linesOn({ ...page, blocks: [block] })
      .filter(({ role }) => role.kind !== 'running' && role.kind !== 'repeated')
      .map((line) => ({
        page: page.number,
        heading: textOf(line),
        isHeading: line.role.kind === 'heading',
        place: `${page.number} ${line.baseline.toFixed(3)}`,
        weight: 1,
      }));
  };
  return page.blocks.flatMap(told);
}

/** Headings that have fewer than two lines of what they head on their page, though there are more of them. */
export function widowedHeadings({ pages }: Booklet): readonly string[] {
  const all = pages.flatMap(bodyOf);
  return all.flatMap(({ isHeading, page, heading }, index) => {
    const next = all[index + 1];
    if (!isHeading || next?.isHeading === true) return next?.page === page || !isHeading ? [] : [heading];
    const rest = all.slice(index + 1);
    const end = rest.findIndex((item) => item.isHeading);
    const under = end < 0 ? rest : rest.slice(0, end);
    const count = (items: readonly Following[]): number =>
      [...new Map(items.map((item) => [item.place, item.weight])).values()].reduce((sum, weight) => sum + weight, 0);
    const here = count(under.filter((item) => item.page === page));
    return here >= Math.min(2, count(under)) ? [] : [`page ${page}: ${heading}`];
  });
}
