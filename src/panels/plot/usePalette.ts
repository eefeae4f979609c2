import { useSyncExternalStore } from 'react';
import type { Palette } from '../../figures/figure.ts';

const names = ['ink', 'faint', 'ground', 'hairline', 'band', 'accent', 'sound', 'doubtful', 'unsound'] as const;

/** The colours of the theme in force, read from the tokens. */
export function readPalette(): Palette {
  const style = getComputedStyle(document.documentElement);
  const read = (name: string) => style.getPropertyValue(`--${name}`).trim();
  return Object.fromEntries(names.map((name) => [name, read(name)])) as unknown as Palette;
}

let palette: Palette | null = null;

function subscribe(listener: () => void): () => void {
  const changed = () => {
    palette = null;
    listener();
  };
  const media = matchMedia('(prefers-color-scheme: dark)');
  media.addEventListener('change', changed);
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
  return () => {
    media.removeEventListener('change', changed);
    observer.disconnect();
  };
}

export function usePalette(): Palette {
  return useSyncExternalStore(subscribe, () => (palette ??= readPalette()));
}
