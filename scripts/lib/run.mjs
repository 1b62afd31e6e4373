/** Child processes, and what Ctrl-C does to them. */
import { spawn } from 'node:child_process';

/** Somebody asked the script to stop. */
export class Interrupted extends Error {}

const running = new Set();
let asked = false;
export const interrupted = () => asked;
/** Resolves when somebody asks the script to stop; work in progress is asked to end too. */
export const interruption = new Promise((resolve) => {
  const ask = () => {
    asked = true;
    for (const child of running) child.kill('SIGTERM');
    resolve();
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, ask);
  // npm passes SIGTERM on to its shell alone, which ends without a word to us.
  const shell = process.ppid;
  if (process.env.npm_lifecycle_event) setInterval(() => process.ppid !== shell && ask(), 500).unref();
});

/** Runs a command and collects what it says. Never throws for its exit code. */
export function collect(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    running.add(child);
    const finish = (result) => {
      running.delete(child);
      resolve(result);
    };
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => finish({ code: 127, output: error.message }));
    child.on('close', (code) => finish({ code: code ?? 1, output }));
  });
}

/** Runs a command and throws Interrupted if it ended because somebody asked the script to stop. */
export async function attempt(command, args, options) {
  const result = await collect(command, args, options);
  if (result.code !== 0 && asked) throw new Interrupted();
  return result;
}

/** The last lines of what a process said. */
export const tail = (output, lines = 40) => output.trimEnd().split('\n').slice(-lines).join('\n');

/** Ends a child politely, then not. */
export function end(child, patience = 12_000) {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) return resolve();
    const timer = setTimeout(() => child.kill('SIGKILL'), patience);
    child.once('exit', () => {
      clearTimeout(timer);
      resolve();
    });
    child.kill('SIGTERM');
  });
}

export const endChildren = () => Promise.all([...running].map((child) => end(child)));

export const wait = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));
