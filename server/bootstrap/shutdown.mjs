const undo = [];
let isEnding = false;

/** Remembers how to stop something that was started here; the last started is stopped first. */
export function onEnd(stop) {
  undo.unshift(stop);
}

/** Stops all that was started here, then exits. A second signal exits at once. */
export async function end(code) {
  if (isEnding) process.exit(code || 1);
  isEnding = true;
  for (const stop of undo) await stop().catch(() => undefined);
  process.exit(code);
}

export function endOnSignals() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void end(0));
}

/** Lets a child end by itself, then by force. */
export function stopChild(child, seconds = 25) {
  return async () => {
    if (child.exitCode !== null || child.signalCode !== null) return;
    child.kill('SIGTERM');
    await Promise.race([new Promise((resolve) => child.once('exit', resolve)), new Promise((resolve) => setTimeout(resolve, seconds * 1000).unref())]);
    if (child.exitCode === null) child.kill('SIGKILL');
  };
}
