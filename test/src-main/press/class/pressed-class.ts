import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import JSZip from 'jszip';
import type { ClassFile } from '../../../../shared-core/class/class-file.ts';
import { pressClass, type PressedClass } from '../../../../src-main/press/class/press-class.ts';

export async function pressed(file: ClassFile, slips = true): Promise<PressedClass> {
  const made = await pressClass(file, { slips });
  if (!made.ok) throw new Error(made.problem);
  return made.value;
}

export function bytesOf({ files }: PressedClass, name: string): Uint8Array {
  const found = files.find(({ file }) => file === name);
  if (found === undefined) throw new Error(`no ${name}`);
  return found.bytes;
}

/**
 * All that a file says to anybody who opens it: a PDF without compression, with texts in plain letters wherever PDF writes
 * them as numbers; every part of a workbook; anything else as it is.
 */
export async function everythingIn(bytes: Uint8Array): Promise<string> {
  const start = Buffer.from(bytes.subarray(0, 5)).toString('latin1');
  if (start === '%PDF-') return unfoldedPdf(bytes);
  if (!start.startsWith('PK')) return new TextDecoder().decode(bytes);
  const archive = await JSZip.loadAsync(bytes);
  const parts = await Promise.all(
    Object.values(archive.files).map(async (part) => `${part.name}\n${await part.async('string')}`),
  );
  return parts.join('\n');
}

function unfoldedPdf(bytes: Uint8Array): string {
  const folder = mkdtempSync(join(tmpdir(), 'normloom-class-'));
  try {
    const [from, to] = [join(folder, 'from.pdf'), join(folder, 'to.pdf')];
    writeFileSync(from, bytes);
    execFileSync('qpdf', ['--qdf', '--object-streams=disable', '--stream-data=uncompress', from, to]);
    const text = readFileSync(to).toString('latin1');
    const decoded = [...text.matchAll(/<([0-9a-fA-F]{8,})>/g)].map(([, hex = '']) =>
      Buffer.from(hex.slice(0, hex.length - (hex.length % 4)), 'hex')
        .swap16()
        .toString('utf16le'),
    );
    const wide = text.replace(/\0/g, '');
    return [text, wide, ...decoded].join('\n');
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
