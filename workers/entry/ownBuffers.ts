/**
 * The buffers of every typed array in an answer, each once, to be handed over rather than copied. Answers are made for one call and
 * their requests arrive as copies, so that nothing else holds these buffers.
 */
export function ownBuffers(answer: unknown): ArrayBuffer[] {
  const found = new Set<ArrayBuffer>();
  const walk = (value: unknown): void => {
    if (ArrayBuffer.isView(value)) {
      if (value.buffer instanceof ArrayBuffer) found.add(value.buffer);
    } else if (typeof value === 'object' && value !== null) {
      Object.values(value).forEach(walk);
    }
  };
  walk(answer);
  return [...found];
}
