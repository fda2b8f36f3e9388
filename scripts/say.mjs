/** A reason not to go on that the person at the keyboard can act on: printed as it is, without a stack. */
export class Stop extends Error {}

/** The person stopped the program while it was at work. */
export class Interrupted extends Error {}

export function say(text) {
  process.stderr.write(`${text}\n`);
}

/** Runs one step of a command. Says its name once it has taken a second, and again every half minute. */
export async function step(name, work) {
  const started = Date.now();
  const seconds = () => Math.round((Date.now() - started) / 1000);
  const first = setTimeout(() => say(`· ${name} …`), 1000);
  const again = setInterval(() => say(`· ${name}: still working (${seconds()} s)`), 30_000);
  try {
    const result = await work();
    if (seconds() > 1) say(`· ${name}: done in ${seconds()} s`);
    return result;
  } finally {
    clearTimeout(first);
    clearInterval(again);
  }
}

/** What to print of a failure: a Stop's own sentence, anything else with its stack. */
export function explain(error) {
  if (error instanceof Stop) return error.message;
  if (error instanceof Interrupted) return 'Stopped.';
  if (error?.code === 'EACCES' || error?.code === 'EPERM') {
    return `No permission to write ${error.path ?? 'a file'}: run as the user who owns this folder, or give this user write access to it.`;
  }
  if (error?.code === 'ENOSPC') return `The disk is full: free some space and start again.`;
  return error?.stack ?? String(error);
}
