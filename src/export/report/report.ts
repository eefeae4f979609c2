/** The content of a dossier as plain data, in reading order. */
export interface Report {
  readonly title: string;
  readonly subtitle: string;
  readonly standing: 'sound' | 'doubtful' | 'unsound';
  readonly standingWords: string;
  readonly sections: readonly Section[];
  /** Printed at the foot of every page beside its number. */
  readonly foot: string;
}

export interface Section {
  readonly heading: string;
  readonly blocks: readonly Block[];
}

export type Block =
  | { readonly kind: 'paragraph'; readonly text: string; readonly strong?: boolean }
  | { readonly kind: 'facts'; readonly rows: readonly (readonly [name: string, value: string])[] }
  | { readonly kind: 'list'; readonly items: readonly string[] }
  | {
      readonly kind: 'table';
      readonly head: readonly string[];
      readonly rows: readonly (readonly string[])[];
      /** Columns set to the right, by index. */
      readonly numbers: readonly number[];
    }
  | { readonly kind: 'figure'; readonly name: 'record' | 'lags' | 'prediction'; readonly caption: string };
