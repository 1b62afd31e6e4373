import { gunzipSync, gzipSync } from 'node:zlib';

/** JSON, gzipped: how runs keep what they read and what they found. */
export const zipped = (value: unknown): Buffer => gzipSync(JSON.stringify(value));

// The caller names the type: what is unzipped was zipped by this file.
export const unzipped = <T>(bytes: Uint8Array): T => JSON.parse(gunzipSync(bytes).toString('utf8')) as T;
