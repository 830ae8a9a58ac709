import { createRequire } from 'node:module';
import type { FontFace } from '../../shared-core/pages/text-width.ts';

// Resolved when the program runs, so that the files are found from the source, the built program and a packed one.
const { resolve } = createRequire(import.meta.url);
const sans = '@expo-google-fonts/source-sans-3';
const serif = '@expo-google-fonts/source-serif-4';

/** Paths of the styles of a family that are printed. */
type FontFamilyFiles = Partial<Record<'normal' | 'bold' | 'italics', string>>;

/** The files of the printed typefaces, under the names that pictures use for them. */
export function fontFiles(): Record<string, FontFamilyFiles> {
  return {
    'Source Sans 3': {
      normal: resolve(`${sans}/400Regular/SourceSans3_400Regular.ttf`),
      bold: resolve(`${sans}/600SemiBold/SourceSans3_600SemiBold.ttf`),
    },
    'Source Serif 4': {
      bold: resolve(`${serif}/600SemiBold/SourceSerif4_600SemiBold.ttf`),
      italics: resolve(`${serif}/400Regular_Italic/SourceSerif4_400Regular_Italic.ttf`),
    },
  };
}

interface FontStyle {
  readonly font: string;
  readonly bold: boolean;
  readonly italics: boolean;
}

export const FONT_STYLES: Readonly<Record<FontFace, FontStyle>> = {
  sans: { font: 'Source Sans 3', bold: false, italics: false },
  'sans-bold': { font: 'Source Sans 3', bold: true, italics: false },
  'serif-bold': { font: 'Source Serif 4', bold: true, italics: false },
  'serif-italic': { font: 'Source Serif 4', bold: false, italics: true },
};
