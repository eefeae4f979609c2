import { useState } from 'react';

type Theme = 'light' | 'dark';

const stored = 'lagwright-theme';

function inForce(): Theme {
  const own = document.documentElement.dataset['theme'];
  if (own === 'light' || own === 'dark') return own;
  return matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light';
}

/** Light or dark; the system's choice until the person makes one. */
export function ThemeSwitch() {
  const [theme, setTheme] = useState(() => {
    const saved = localStorage.getItem(stored);
    if (saved === 'light' || saved === 'dark') document.documentElement.dataset['theme'] = saved;
    return inForce();
  });
  const other = theme === 'light' ? 'dark' : 'light';
  return (
    <button
      type="button"
      onClick={() => {
        document.documentElement.dataset['theme'] = other;
        localStorage.setItem(stored, other);
        setTheme(other);
      }}
    >
      {other === 'dark' ? 'Dark' : 'Light'}
    </button>
  );
}
