import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { composeBooklet } from '../../shared-core/pages/booklet-pages.ts';
import { programVersion } from '../program-version.ts';
import { placedPdf, type DrawnPdf } from './placed-pdf.ts';
import { releaseDay } from './release-day.ts';

/** The booklet of a set as a tagged PDF. The same set gives the same bytes. */
export function bookletPdf(normSet: NormSet, onProgress?: (share: number) => void): Promise<DrawnPdf> {
  return placedPdf(
    composeBooklet(normSet, programVersion()),
    { language: 'en', day: releaseDay(normSet.project) },
    onProgress,
  );
}
