/** Names in braces in a template: "page" and "pages" in "page {page} of {pages}". */
export type PlaceholdersOf<Template extends string> = Template extends `${string}{${infer Name}}${infer Rest}`
  ? Name | PlaceholdersOf<Rest>
  : never;

const PLACEHOLDER = /\{([a-z][a-z0-9-]*)\}/g;

/** The names in braces in a text, each once, in alphabetical order. */
export function placeholdersIn(text: string): readonly string[] {
  return [...new Set([...text.matchAll(PLACEHOLDER)].map(([, name = '']) => name))].sort();
}

/** A part of a filled template: words of the template, or the value of a placeholder. */
export interface FilledPart {
  readonly text: string;
  /** Null for words of the template. */
  readonly placeholder: string | null;
}

/** The template with its values, in parts. A value is put in as it is, whatever it holds; throws where one is missing. */
export function filledParts(template: string, values: Readonly<Record<string, string>>): readonly FilledPart[] {
  return template
    .split(/(\{[a-z][a-z0-9-]*\})/)
    .filter((part) => part !== '')
    .map((part) => {
      const placeholder = /^\{([a-z][a-z0-9-]*)\}$/.exec(part)?.[1];
      if (placeholder === undefined) return { text: part, placeholder: null };
      const text = values[placeholder];
      if (text === undefined) throw new RangeError(`no value for {${placeholder}}`);
      return { text, placeholder };
    });
}
