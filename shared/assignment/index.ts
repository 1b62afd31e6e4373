/** The pairing engine's public surface; see README.md. */
export * from './problem';
export * from './reduction';
