import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { composeBooklet } from '../../shared-core/pages/booklet-pages.ts';
import { bookletSections, type BookletSection } from '../../shared-core/pages/booklet-sections.ts';
import { programVersion } from '../program-version.ts';
import { placedPdf, type DrawnPdf } from './placed-pdf.ts';
import { releaseDay } from './release-day.ts';

export interface DrawnBooklet extends DrawnPdf {
  readonly sections: readonly BookletSection[];
}

/** The booklet of a set as a tagged PDF. The same set gives the same bytes. */
export async function bookletPdf(normSet: NormSet, onProgress?: (share: number) => void): Promise<DrawnBooklet> {
  const booklet = composeBooklet(normSet, programVersion());
  const drawn = await placedPdf(booklet, releaseDay(normSet.project), onProgress);
  return { ...drawn, sections: bookletSections(booklet.pages) };
}
