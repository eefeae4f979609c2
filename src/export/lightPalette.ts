import type { Palette } from '../figures/figure.ts';

/** Colours on paper are those of the light theme, whatever the screen shows: read from the tokens with that theme in force. */
export function lightPalette(): Palette {
  const names = ['ink', 'faint', 'ground', 'hairline', 'band', 'accent', 'sound', 'doubtful', 'unsound'] as const;
  const root = document.documentElement;
  const own = root.dataset['theme'];
  root.dataset['theme'] = 'light';
  const style = getComputedStyle(root);
  const palette = Object.fromEntries(names.map((name) => [name, style.getPropertyValue(`--${name}`).trim()]));
  if (own === undefined) delete root.dataset['theme'];
  else root.dataset['theme'] = own;
  return palette as unknown as Palette;
}
