/** Debian's Chromium, for the browser tests. */
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installDebian } from './debian.mjs';
import { Stop } from './say.mjs';

const NEEDED =
  'Chromium is not installed. Install it (Debian: apt-get install chromium), or set CHROMIUM to its path, then run this again.';

function find() {
  const folders = ['/usr/bin', ...(process.env.PATH ?? '').split(delimiter)];
  for (const name of ['chromium', 'chromium-browser', 'google-chrome'])
    for (const folder of folders) if (existsSync(join(folder, name))) return join(folder, name);
  return null;
}

/** The path of a browser to drive. */
export async function ensureBrowser() {
  const wished = process.env.CHROMIUM;
  if (wished && !existsSync(wished))
    throw new Stop(`CHROMIUM names ${wished}, and there is no such file. Set it to a browser’s path.`);
  const found = wished || find();
  if (found) return found;
  await installDebian(['chromium'], NEEDED);
  const installed = find();
  if (!installed) throw new Stop(NEEDED);
  return installed;
}
