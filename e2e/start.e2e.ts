import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from './harness/built-app.js';

describe('npm start', () => {
  it('serves the application with the demo shop, says where, and ends when asked to', async () => {
    const dataDir = await mkdtemp(join(tmpdir(), 'layerwright-start-'));
    const port = await freePort();
    const child = spawn(process.execPath, ['.ci/start.mjs'], {
      cwd: join(import.meta.dirname, '..'),
      env: { ...process.env, PORT: String(port), DATA_DIR: dataDir, npm_lifecycle_event: undefined },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    const ended = once(child, 'close');
    let said = '';
    try {
      const address = await new Promise<string>((resolve, reject) => {
        const listen = (part: Buffer): void => {
          said += part.toString();
          const found = /Layerwright is at (\S+)/.exec(said)?.[1];
          if (found !== undefined) resolve(found);
        };
        child.stdout.on('data', listen);
        child.stderr.on('data', listen);
        child.once('close', () => reject(new Error(said)));
      });
      expect(address).toBe(`http://127.0.0.1:${port}`);
      const page = await fetch(address);
      expect(page.status).toBe(200);
      expect(await page.text()).toContain('<lw-root');
    } finally {
      child.kill('SIGTERM');
      const [code] = await ended;
      expect(code).withContext(said).toBe(0);
      await rm(dataDir, { recursive: true, force: true });
    }
  }, 180_000);
});
