/** Texts that read as a gap unless the person says otherwise. The empty cell always is one. */
export const defaultGapWords: readonly string[] = [
  '-',
  '--',
  '---',
  '.',
  '?',
  'n/a',
  'na',
  '#n/a',
  'nan',
  'nil',
  'none',
  'null',
];
