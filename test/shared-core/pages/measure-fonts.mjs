// Prints shared-core/pages/font-widths.ts from the bundled font files:
//   node test/shared-core/pages/measure-fonts.mjs > shared-core/pages/font-widths.ts
// The advance widths come from the `hmtx` table of each font by way of its `cmap` (OpenType specification 1.9).
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

const LAST_CODE_POINT = 0x22ff;
const ROW = 64;
const FACES = {
  sans: '@expo-google-fonts/source-sans-3/400Regular/SourceSans3_400Regular.ttf',
  'sans-bold': '@expo-google-fonts/source-sans-3/600SemiBold/SourceSans3_600SemiBold.ttf',
  'serif-bold': '@expo-google-fonts/source-serif-4/600SemiBold/SourceSerif4_600SemiBold.ttf',
  'serif-italic': '@expo-google-fonts/source-serif-4/400Regular_Italic/SourceSerif4_400Regular_Italic.ttf',
};

const require = createRequire(import.meta.url);

function measure(path) {
  const file = readFileSync(path);
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  const tables = new Map();
  for (let index = 0; index < view.getUint16(4); index += 1) {
    const entry = 12 + 16 * index;
    tables.set(file.toString('latin1', entry, entry + 4), view.getUint32(entry + 8));
  }
  const toThousandths = (units) => Math.round((units * 1000) / view.getUint16(tables.get('head') + 18));
  const longMetrics = view.getUint16(tables.get('hhea') + 34);
  const advance = (glyph) => view.getUint16(tables.get('hmtx') + 4 * Math.min(glyph, longMetrics - 1));
  const glyphs = glyphsByCodePoint(view, tables.get('cmap'));
  const rows = [];
  for (let start = 0x20; start <= LAST_CODE_POINT; start += ROW - (start % ROW)) {
    const end = start + ROW - (start % ROW);
    const codes = Array.from({ length: end - start }, (_, index) => start + index);
    const widths = codes.map((code) => (glyphs.has(code) ? String(toThousandths(advance(glyphs.get(code)))) : '-'));
    const text = widths.join(' ').replace(/( -)+$/, '');
    if (text !== '-') rows.push([start, text]);
  }
  return rows;
}

function glyphsByCodePoint(view, cmap) {
  const glyphs = new Map();
  for (let index = 0; index < view.getUint16(cmap + 2); index += 1) {
    const table = cmap + view.getUint32(cmap + 4 + 8 * index + 4);
    if (view.getUint16(table) === 4) readSegments(view, table, glyphs);
  }
  return glyphs;
}

function readSegments(view, table, glyphs) {
  const twice = view.getUint16(table + 6);
  const [ends, starts] = [table + 14, table + 16 + twice];
  const [deltas, offsets] = [starts + twice, starts + 2 * twice];
  for (let at = 0; at < twice; at += 2) {
    const start = view.getUint16(starts + at);
    const offset = view.getUint16(offsets + at);
    for (let code = start; code <= Math.min(view.getUint16(ends + at), LAST_CODE_POINT); code += 1) {
      const raw = offset === 0 ? code : view.getUint16(offsets + at + offset + 2 * (code - start));
      const glyph = raw === 0 ? 0 : (raw + view.getUint16(deltas + at)) & 0xffff;
      if (glyph !== 0) glyphs.set(code, glyph);
    }
  }
}

const entries = Object.entries(FACES).map(([face, path]) => {
  const rows = measure(require.resolve(path));
  const name = /^\w+$/.test(face) ? face : `'${face}'`;
  const lines = rows.map(([start, text]) => {
    const key = `      0x${start.toString(16)}:`;
    return `${key} '${text}',`.length > 120 && start > 0xff ? `${key}\n        '${text}',` : `${key} '${text}',`;
  });
  return `  ${name}: {\n    rows: {\n${lines.join('\n')}\n    },\n  },\n`;
});

process.stdout.write(`/**
 * Advance widths of the printed typefaces in thousandths of the type size, made from the font files by
 * test/shared-core/pages/measure-fonts.mjs. Each row begins at a code point; a hyphen stands for a missing character.
 */
export const FONT_WIDTHS = {
${entries.join('')}} as const;
`);
