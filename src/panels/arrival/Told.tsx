import type { ReactNode } from 'react';

/** One thing that was detected: the sentence that says it, and the controls that change it. */
export function Told({ sentence, children }: { readonly sentence: string; readonly children: ReactNode }) {
  return (
    <li className="told">
      <p>{sentence}</p>
      <div className="told-controls">{children}</div>
    </li>
  );
}
