/** A paragraph with its bold lead. */
export interface Paragraph {
  readonly lead: string;
  readonly text: string;
}
