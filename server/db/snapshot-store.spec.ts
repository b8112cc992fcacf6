import { copyFile, readFile, readdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { EmbeddedDatabase } from './embedded-database.js';
import { Design } from './entities/index.js';
import { diskFileSystem } from './file-system.js';
import { DamagedDatabaseError, SnapshotStore } from './snapshot-store.js';
import { verifyImage } from './verify-image.js';
import { systemError } from '../testing/faulty-file-system.js';
import { emptyImage } from '../testing/memory-database.js';
import { addOwner, designRow } from '../testing/rows.js';
import { seededRandom } from '../testing/seeded-random.js';
import { removeTemporaryFolders, temporaryFolder } from '../testing/temporary-folder.js';

describe('SnapshotStore', () => {
  let folder: string;

  beforeEach(async () => {
    folder = await temporaryFolder();
  });

  afterEach(removeTemporaryFolders);

  function store(files = diskFileSystem): SnapshotStore {
    return new SnapshotStore({ folder, files, verify: verifyImage });
  }

  it('finds nothing in an empty folder, and gives back what was saved last', async () => {
    expect((await store().load()).image).toBeNull();
    const images = await generations(store(), 2);

    const loaded = await store().load();

    expect(loaded.image).toEqual(images[1]!);
    expect(loaded.damaged).toEqual([]);
  });

  it('keeps the three generations before the newest', async () => {
    const saving = store();
    await generations(saving, 7);
    await saving.idle();

    const kept = (await readdir(folder)).sort().map((name) => Number(name.slice(12, 22)));

    expect(kept).toEqual([4, 5, 6, 7]);
  });

  it('detects each of 1000 seeded mutations of the newest snapshot and uses the one before', async () => {
    const [previous, newest] = (await generations(store(), 2)) as [Uint8Array, Uint8Array];
    const name = (await readdir(folder)).sort()[1]!;
    const random = seededRandom(7);
    const mutationOf = { flip, cut, zero, lengthen, empty };
    const kinds = Object.keys(mutationOf) as (keyof typeof mutationOf)[];

    for (let n = 0; n < 1000; n += 1) {
      const kind = kinds[n % kinds.length]!;
      const mutated = mutationOf[kind](newest, random);
      const loading = store({
        ...diskFileSystem,
        read: (path) => (path.endsWith(name) ? Promise.resolve(mutated) : diskFileSystem.read(path)),
        rename: () => Promise.resolve(),
      });
      const loaded = await loading.load();
      expect(loaded.damaged.map((damaged) => damaged.name))
        .withContext(`${kind}, ${n}`)
        .toEqual([name]);
      expect(Buffer.compare(loaded.image!, previous)).withContext(`${kind}, ${n}`).toBe(0);
    }
  });

  it('sets a damaged generation aside for rescue and never uses its number again', async () => {
    await generations(store(), 2);
    const newest = (await readdir(folder)).sort()[1]!;
    await writeFile(join(folder, newest), 'no database');

    const loading = store();
    expect((await loading.load()).generation).toBe(1);
    await loading.save(await emptyImage());

    expect(await readFile(join(folder, `${newest}.damaged`), 'utf8')).toBe('no database');
    expect((await store().load()).generation).toBe(3);
  });

  it('refuses to start when no generation is good, and leaves every file as it is', async () => {
    await generations(store(), 2);
    for (const name of await readdir(folder)) await writeFile(join(folder, name), 'no database');
    const before = await readdir(folder);

    await expectAsync(store().load()).toBeRejectedWithError(
      DamagedDatabaseError,
      /None of the database snapshots/,
    );
    expect(await readdir(folder)).toEqual(before);
  });

  it('refuses to start empty when only generations set aside are left', async () => {
    await generations(store(), 1);
    const [name] = (await readdir(folder)) as [string];
    await diskFileSystem.rename(join(folder, name), join(folder, `${name}.damaged`));

    await expectAsync(store().load()).toBeRejectedWithError(DamagedDatabaseError);
  });

  it('does not fall back when the newest may be sound but may not be read', async () => {
    await generations(store(), 2);
    const denied = store({ ...diskFileSystem, read: () => Promise.reject(systemError('EACCES')) });
    await expectAsync(denied.load()).toBeRejectedWithError(/EACCES/);

    const newest = (await readdir(folder)).sort()[1]!;
    const unreadable = store({
      ...diskFileSystem,
      read: (path) =>
        path.endsWith(newest) ? Promise.reject(systemError('EIO')) : diskFileSystem.read(path),
    });
    expect((await unreadable.load()).generation).toBe(1);
  });

  it('finds a sound file that breaks the rules of the database', async () => {
    const database = await EmbeddedDatabase.open(await emptyImage());
    await database.dataSource.query('PRAGMA foreign_keys = OFF');
    await database.manager.insert(Design, designRow('orphan'));

    expect(await verifyImage(database.exportImage())).toBe('2 rows refer to rows that are not there');
    await database.close();
  });

  it('restores a generation that was copied away and back', async () => {
    const images = await generations(store(), 1);
    const [name] = (await readdir(folder)) as [string];
    const elsewhere = await temporaryFolder();
    await copyFile(join(folder, name), join(elsewhere, name));

    folder = elsewhere;
    expect((await store().load()).image).toEqual(images[0]!);
  });

  it('clears away what a crash left half written', async () => {
    await generations(store(), 1);
    const half = `layerwright-0000000002-${'0'.repeat(64)}.sqlite.tmp`;
    await writeFile(join(folder, half), 'half');

    expect((await store().load()).generation).toBe(1);
    expect(await readdir(folder)).not.toContain(half);
  });
});

/** Saves `count` databases, each with one design more than the one before. */
async function generations(store: SnapshotStore, count: number): Promise<Uint8Array[]> {
  await store.load();
  const database = await EmbeddedDatabase.open(await emptyImage());
  await addOwner(database.manager);
  const images: Uint8Array[] = [];
  for (let n = 0; n < count; n += 1) {
    await database.manager.insert(Design, designRow(`design-${n}`));
    images.push(new Uint8Array(Buffer.from(database.exportImage())));
    await store.save(images[n]!);
  }
  await database.close();
  return images.map((image) => Buffer.from(image));
}

type Random = () => number;

function flip(bytes: Uint8Array, random: Random): Uint8Array {
  const mutated = Uint8Array.from(bytes);
  const at = Math.floor(random() * mutated.length);
  mutated[at] = mutated[at]! ^ (1 << Math.floor(random() * 8));
  return mutated;
}

function cut(bytes: Uint8Array, random: Random): Uint8Array {
  return bytes.slice(0, Math.floor(random() * bytes.length));
}

function zero(bytes: Uint8Array, random: Random): Uint8Array {
  const mutated = Uint8Array.from(bytes);
  const page = Math.floor((random() * mutated.length) / 512) * 512;
  // The header's page always holds something, an emptied page elsewhere may have been empty.
  return mutated.fill(0, page, page + 512).some((byte, at) => byte !== bytes[at])
    ? mutated
    : mutated.fill(0, 0, 512);
}

function lengthen(bytes: Uint8Array, random: Random): Uint8Array {
  return Buffer.concat([bytes, new Uint8Array(1 + Math.floor(random() * 5000))]);
}

function empty(): Uint8Array {
  return new Uint8Array();
}
