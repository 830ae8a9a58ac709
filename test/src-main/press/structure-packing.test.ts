import { describe, expect, it } from 'vitest';
import { bookletPdf } from '../../../src-main/press/booklet-pdf.ts';
import { packStructure } from '../../../src-main/press/structure-packing.ts';
import { sampleNormSet, WHOLE_SCALE } from '../../shared-core/pages/sample-norm-set.ts';

describe('packStructure', () => {
  it('keeps the elements of the tree in streams, and so few bytes for each cell', async () => {
    const sizeOf = async (columns: readonly ('t' | 'nce' | 'sten' | 'stanine')[]): Promise<number> => {
      const normSet = sampleNormSet({ scale: WHOLE_SCALE, groups: ['4', '5', '6'] }, (project) => ({
        ...project,
        table: { ...project.table, columns },
      }));
      const { pdf } = await bookletPdf(normSet);
      expect(Buffer.from(pdf).toString('latin1')).not.toContain('/S /TD');
      return pdf.length;
    };
    const cells = 3 * 41 * 3;
    expect((await sizeOf(['t', 'nce', 'sten', 'stanine'])) - (await sizeOf(['t']))).toBeLessThan(cells * 70);
  });

  it('refuses what pdfkit does not write', async () => {
    const { pdf } = await bookletPdf(sampleNormSet({ scale: { min: 0, max: 4, step: 1 } }));
    // Packed already: without the table of places that it takes.
    expect(() => packStructure(pdf)).toThrow('not a PDF as pdfkit writes it');
    expect(() => packStructure(new TextEncoder().encode('%PDF-1.7\n'))).toThrow('not a PDF as pdfkit writes it');
  });
});
