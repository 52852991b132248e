import { watch } from 'node:fs';
import type { KeptChild } from '@/server/launch/child-process';

/** Editors write a file in several steps; one restart is enough for all of them. */
const SETTLE_MS = 300;
const WATCHED = ['server', 'schemas', 'migrations'];

/** Start the server's processes again when their code changes. */
export function restartOnChange(children: readonly KeptChild[], say: (line: string) => void): void {
  let timer: NodeJS.Timeout | undefined;
  const onChange = (folder: string, name: string | null): void => {
    if (!name || !/\.(ts|json)$/.test(name)) return;
    clearTimeout(timer);
    timer = setTimeout(() => {
      say(`${folder}/${name} changed: starting the server again`);
      for (const child of children) child.restart();
    }, SETTLE_MS);
  };
  for (const folder of WATCHED) watch(folder, { recursive: true }, (_, name) => onChange(folder, name));
}

/** Arguments of Node for Expo's development server; `metro.config.js` lets it hand requests on to the web server. */
export const expoProgram = (port: string): string[] => [
  require.resolve('expo/bin/cli'),
  'start',
  '--web',
  '--localhost',
  '--port',
  port,
];

/** It asks nobody outside, reports nothing, and leaves tsconfig.json alone. */
export const expoEnvironment = (serverPort: string): Record<string, string> => ({
  SERVER_PORT: serverPort,
  EXPO_OFFLINE: '1',
  EXPO_NO_TELEMETRY: '1',
  EXPO_NO_TYPESCRIPT_SETUP: '1',
});
