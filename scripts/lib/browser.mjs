/** Debian's Chromium, for the browser tests. */
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installDebian } from './postgres.mjs';
import { Stop } from './say.mjs';

const NEEDED =
  'Chromium is not installed. Install it (Debian: apt-get install chromium), or set CHROMIUM to its path, then run this again.';

function find() {
  if (process.env.CHROMIUM) return process.env.CHROMIUM;
  const folders = ['/usr/bin', ...(process.env.PATH ?? '').split(delimiter)];
  for (const name of ['chromium', 'chromium-browser', 'google-chrome'])
    for (const folder of folders) if (existsSync(join(folder, name))) return join(folder, name);
  return null;
}

export async function ensureBrowser() {
  const found = find();
  if (found) return found;
  await installDebian(['chromium'], NEEDED);
  const installed = find();
  if (!installed) throw new Stop(NEEDED);
  return installed;
}
