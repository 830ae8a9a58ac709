import { createRequire } from 'node:module';
import type { FontFace } from '../../shared-core/pages/text-width.ts';

// Resolved when the program runs, so that the files are found from the source, the built program and a packed one.
const { resolve } = createRequire(import.meta.url);
const sans = '@expo-google-fonts/source-sans-3';
const serif = '@expo-google-fonts/source-serif-4';

/** The files of the printed faces. */
export const FONT_FILES: Readonly<Record<FontFace, string>> = {
  sans: resolve(`${sans}/400Regular/SourceSans3_400Regular.ttf`),
  'sans-bold': resolve(`${sans}/600SemiBold/SourceSans3_600SemiBold.ttf`),
  'serif-bold': resolve(`${serif}/600SemiBold/SourceSerif4_600SemiBold.ttf`),
  'serif-italic': resolve(`${serif}/400Regular_Italic/SourceSerif4_400Regular_Italic.ttf`),
};

/** The typeface of pictures, under the name that they use for it. */
export const PICTURE_FONTS = { 'Source Sans 3': { normal: FONT_FILES.sans, bold: FONT_FILES['sans-bold'] } } as const;

/** Every face under its own name, for running text. */
export const FACE_FONTS = {
  sans: { normal: FONT_FILES.sans },
  'sans-bold': { normal: FONT_FILES['sans-bold'] },
  'serif-bold': { normal: FONT_FILES['serif-bold'] },
  'serif-italic': { normal: FONT_FILES['serif-italic'] },
} as const satisfies Record<FontFace, { readonly normal: string }>;
