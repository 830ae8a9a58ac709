import { EDITION_FORMAT } from '../../../shared-core/norms/edition-file.ts';
import { NORM_SET_FORMAT } from '../norm-set-json.ts';
import { CERTIFICATE_FORMAT } from './certificate.ts';

/** A pressed file as its content tells it. */
export type PressedContent =
  | { readonly kind: 'booklet' | 'workbook' }
  | { readonly kind: 'csv' | 'edition'; readonly text: string }
  | { readonly kind: 'norm-set' | 'certificate'; readonly content: unknown };

/** What kind of pressed file the bytes are, by their content; null for anything that Normloom does not press. */
export function pressedContent(bytes: Uint8Array): PressedContent | null {
  const start = new TextDecoder('latin1').decode(bytes.subarray(0, 5));
  if (start === '%PDF-') return { kind: 'booklet' };
  if (start.startsWith('PK\u0003\u0004')) return { kind: 'workbook' };
  const text = new TextDecoder('utf-8').decode(bytes);
  if (/^[^\r\n]*\braw-score,n,count\b/.test(text)) return { kind: 'csv', text };
  const content = jsonIn(text);
  const format = typeof content === 'object' && content !== null && 'format' in content ? content.format : null;
  if (format === EDITION_FORMAT) return { kind: 'edition', text };
  if (format === NORM_SET_FORMAT) return { kind: 'norm-set', content };
  return format === CERTIFICATE_FORMAT ? { kind: 'certificate', content } : null;
}

function jsonIn(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
