import { useState } from 'react';

interface CommitFieldProps {
  readonly label: string;
  readonly value: string;
  readonly kind?: 'text' | 'number';
  readonly min?: number;
  readonly max?: number;
  /** Called with a changed text when the field is left or Enter is pressed. */
  readonly onCommit: (value: string) => void;
}

/** A labelled field whose text counts only once it is finished. A new value from outside takes the place of what was typed. */
export function CommitField({ label, value, kind = 'text', min, max, onCommit }: CommitFieldProps) {
  const [typed, setTyped] = useState({ from: value, text: value });
  const text = typed.from === value ? typed.text : value;
  const commit = () => {
    if (text !== value) onCommit(text);
  };
  return (
    <label className="field">
      {label}
      <input
        type={kind}
        value={text}
        {...(kind === 'number' ? { min, max, step: 'any' } : {})}
        onChange={(event) => setTyped({ from: value, text: event.target.value })}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
        }}
      />
    </label>
  );
}
