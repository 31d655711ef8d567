import { spawn } from 'node:child_process';

/** Environment of a child without what npm added for its own script. */
export function plainEnvironment(extra = {}) {
  const kept = Object.entries(process.env).filter(([name]) => !/^(?:npm_lifecycle|npm_package|npm_command|npm_node|INIT_CWD|NODE_ENV$)/.test(name));
  return { ...Object.fromEntries(kept), ...extra };
}

/**
 * Runs a command to its end. Its output is kept and shown only when it fails, unless `show`.
 *
 * @returns what it printed
 */
export function run(command, args, { env, cwd, uid, gid, show = false, input } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { env: env ?? plainEnvironment(), cwd, uid, gid, stdio: [input === undefined ? 'ignore' : 'pipe', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'] });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    if (input !== undefined) child.stdin.end(input);
    child.on('error', reject);
    child.on('close', (code) => (code === 0 ? resolve(output) : reject(Object.assign(new Error(`${command} ${args.slice(0, 3).join(' ')} ended with ${code}\n${output.slice(-4000)}`), { output, code }))));
  });
}
