/** One line a step with its seconds; nothing else of the step's own noise unless it fails. */
export async function step(name, work) {
  const start = process.hrtime.bigint();
  process.stdout.write(`  ${name} … `);
  try {
    const note = await work();
    const seconds = Number(process.hrtime.bigint() - start) / 1e9;
    process.stdout.write(`${note ? `${note}, ` : ''}${seconds.toFixed(1)} s\n`);
    return seconds;
  } catch (error) {
    process.stdout.write('failed\n');
    throw error;
  }
}

