/**
 * Answers no earlier than `ms` after it was asked, also with an error: how long something took
 * then does not tell whether an address is known.
 */
export async function atPace<T>(ms: number, work: () => Promise<T>): Promise<T> {
  const started = performance.now();
  try {
    return await work();
  } finally {
    const left = ms - (performance.now() - started);
    if (left > 0) await new Promise((resolve) => setTimeout(resolve, left));
  }
}
