/** Debian packages, installed where that is allowed. */
import { existsSync } from 'node:fs';
import { must } from './must.mjs';
import { attempt } from './run.mjs';
import { step, Stop } from './say.mjs';

const APT = [
  '-qq',
  '-o',
  'Dpkg::Options::=--force-confold',
  '-o',
  'DPkg::Lock::Timeout=120',
  '-o',
  'Acquire::Retries=3',
];

/** Installs as root or through sudo without a question; otherwise stops with the sentence. `before` is a shell line run first. */
export async function installDebian(packages, sentence, before = 'true') {
  const sudo = process.getuid?.() === 0 ? [] : ['sudo', '-n'];
  const may = existsSync('/usr/bin/apt-get') && (!sudo.length || (await attempt('sudo', ['-n', 'true'])).code === 0);
  if (!may) throw new Stop(sentence);
  const asRoot = (...words) => {
    const [program, ...args] = [...sudo, 'env', 'DEBIAN_FRONTEND=noninteractive', ...words];
    return must(sentence, program, args);
  };
  await step(`Installing ${packages.join(', ')} from Debian (apt-get)`, async () => {
    await asRoot('sh', '-c', before);
    await asRoot('apt-get', ...APT, 'update');
    await asRoot('apt-get', ...APT, 'install', '-y', '--no-install-recommends', ...packages);
  });
}
