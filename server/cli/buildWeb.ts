/** The web client as static files in `dist`, built again only when something that goes into it has changed. */
import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

import { hashOf, inProject, projectRoot, stateFolder } from './projectFiles';
import { lastLines, tryTool, type Say } from './runTool';

/** Where the built client lies. */
export const webRoot = inProject('dist');

const sources = ['app', 'shared', 'flows', 'fonts', 'public', 'app.json', 'babel.config.cjs', 'metro.config.cjs', 'package-lock.json', 'tsconfig.json'];

/** Builds the client when `dist` does not hold the present sources; resolves with what it did. `signal` ends the build. */
export async function buildWeb(say: Say, signal?: AbortSignal): Promise<'built' | 'kept'> {
  const marker = join(stateFolder, 'web-build');
  const wanted = hashOf(sources);
  if (existsSync(join(webRoot, 'index.html')) && existsSync(marker) && readFileSync(marker, 'utf8') === wanted) return 'kept';

  say('Building the web client (under a minute the first time) …');
  mkdirSync(stateFolder, { recursive: true });
  // Built beside and moved in when whole: a server that runs meanwhile never serves half a client.
  const next = join(stateFolder, 'web-next');
  rmSync(next, { recursive: true, force: true });
  const { code, output } = await tryTool(process.execPath, [inProject('node_modules/expo/bin/cli'), 'export', '-p', 'web', '--output-dir', next], {
    cwd: projectRoot,
    // Without CI it may ask a question; telemetry would look up a host.
    env: { ...process.env, NODE_ENV: 'production', CI: '1', EXPO_NO_TELEMETRY: '1', EXPO_OFFLINE: '1' },
    signal,
  });
  if (code !== 0 || !existsSync(join(next, 'index.html'))) throw new Error(`The web client could not be built:\n${lastLines(output, 30)}`);
  rmSync(marker, { force: true });
  rmSync(webRoot, { recursive: true, force: true });
  renameSync(next, webRoot);
  writeFileSync(marker, wanted);
  return 'built';
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  console.log(`dist: ${await buildWeb(console.log)}`);
}
