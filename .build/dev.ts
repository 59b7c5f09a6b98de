/** Development: the server from source on port 5181 with the demo study in memory, and Vite's server on port 5180 before it. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { createServer } from 'vite';
import { compileSchemas } from './schemas.ts';

const root = join(import.meta.dirname, '..');
await compileSchemas();

const api = spawn(
  process.execPath,
  ['--watch', '--import', 'tsx', 'cli/main.ts', 'serve', '--demo', '--port', '5181', '--data', 'data/dev'],
  { cwd: root, stdio: 'inherit' },
);
const web = await createServer({ configFile: join(root, 'vite.config.ts') });
await web.listen();
web.printUrls();

for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.once(signal, () => {
    api.kill(signal);
    void web.close().then(() => process.exit(0));
  });
}
