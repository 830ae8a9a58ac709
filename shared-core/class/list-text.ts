/** Marks that no eye sees: controls, byte order marks, and those that turn the direction of writing. */
const UNSEEN = /[\u0000-\u001f\u007f-\u009f\u00ad\u200b\u200e\u200f\u202a-\u202e\u2060\u2066-\u2069\ufeff]/g;

/** A cell of a class list in one line: letters as they were written, without the space around them and unseen marks. */
export function cellText(cell: string): string {
  return cell.replace(/\s+/g, ' ').replace(UNSEEN, '').trim();
}

/** The same text for texts that differ in case, width or composition of their letters only. */
export function foldedText(text: string): string {
  return cellText(text).normalize('NFKC').toUpperCase().toLowerCase().normalize('NFC');
}
