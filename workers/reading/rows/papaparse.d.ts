/**
 * The one part of papaparse that is used: its row parser, fed with strings. Declared here (and mapped to in
 * `.config/tsconfig.base.json`) because the published types pull in Node's and the DOM's, which the core must not see.
 */
interface ParserSettings {
  readonly delimiter: string;
  readonly newline: string;
  readonly quoteChar: string;
  /** true: quotes are characters like any other; undefined: fast where a chunk has no quotes. */
  readonly fastMode?: boolean;
}
interface Parsed {
  readonly data: string[][];
  readonly meta: { readonly cursor: number };
  readonly errors: readonly { readonly code: string; readonly row: number }[];
}
interface RowParser {
  /** `ignoreLastRow`: the last row may be incomplete; the cursor then stands at its beginning. */
  parse(input: string, baseIndex: number, ignoreLastRow: boolean): Parsed;
}
declare const Papa: { Parser: new (settings: ParserSettings) => RowParser };
export default Papa;
