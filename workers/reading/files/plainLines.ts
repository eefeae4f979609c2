/** Whether a carriage return stands anywhere but before a line feed. */
function hasLoneReturn(text: string): boolean {
  for (let at = text.indexOf('\r'); at >= 0; at = text.indexOf('\r', at)) {
    while (text.charCodeAt(at) === 13) at++;
    if (text.charCodeAt(at) !== 10) return true;
  }
  return false;
}

/**
 * A text with line feeds alone and without byte order mark. Carriage returns before a line feed are left to the row splitter.
 *
 * @param text as it was decoded
 * @returns the text, the same where it has no lone carriage return
 */
export function plainLines(text: string): string {
  const bare = text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
  if (!hasLoneReturn(bare)) return bare;
  return bare.replace(/\r+\n?/gu, (run) => (run.endsWith('\n') ? '\n' : '\n'.repeat(run.length)));
}
