/** Child processes. */
import { spawn } from 'node:child_process';
import { Stop } from './say.mjs';

/** Runs a command and collects what it says. Never throws for its exit code. */
export function collect(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => resolve({ code: 127, output: error.message }));
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** Runs a command that must succeed; otherwise a sentence, followed by the end of what it said. */
export async function must(sentence, command, args, options) {
  const { code, output } = await collect(command, args, options);
  if (code !== 0) throw new Stop(`${sentence}\n${output.split('\n').slice(-40).join('\n')}`);
  return output;
}

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

export const wait = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));
