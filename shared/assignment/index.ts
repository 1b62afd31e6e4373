/** The pairing engine's public surface; see README.md. */
export * from './problem';
export * from './reduction';
export { solve } from './solve';
export { verify, type Verdict } from './certificate';
