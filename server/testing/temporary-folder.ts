import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** A new empty folder; {@link removeTemporaryFolders} clears it away. */
export async function temporaryFolder(): Promise<string> {
  const folder = await mkdtemp(join(tmpdir(), 'layerwright-spec-'));
  folders.push(folder);
  return folder;
}

/** Clears away every folder made since the last time; for `afterEach`. */
export async function removeTemporaryFolders(): Promise<void> {
  await Promise.all(folders.splice(0).map((folder) => rm(folder, { recursive: true, force: true })));
}

const folders: string[] = [];
