import { randomBytes } from 'node:crypto';
import { readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { diskFileSystem, errorCode, writeSynced } from './db/file-system.js';

const FILE = 'session-secret';

/** The secret that cookies are signed with, kept in the data folder and made there when it is absent. */
export async function sessionSecretIn(folder: string): Promise<string> {
  const path = join(folder, FILE);
  try {
    const secret = (await readFile(path, 'utf8')).trim();
    if (secret.length >= 32) return secret;
    throw new Error(`${path} holds no secret of at least 32 characters. Delete it to have a new one made.`);
  } catch (error) {
    if (errorCode(error) !== 'ENOENT') throw error;
  }
  const secret = randomBytes(32).toString('base64url');
  // Complete or not at all: half a secret would be taken for one that somebody chose.
  const temporary = `${path}.tmp`;
  await rm(temporary, { force: true });
  await writeSynced(diskFileSystem, temporary, Buffer.from(`${secret}\n`));
  await diskFileSystem.rename(temporary, path);
  await diskFileSystem.syncFolder(folder);
  return secret;
}
