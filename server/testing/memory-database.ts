import { EmbeddedDatabase } from '../db/embedded-database.js';
import { WriteQueue, type WriteQueueOptions } from '../db/write-queue.js';

let migratedImage: Promise<Uint8Array> | undefined;

/** The image of an empty database with every migration run; made once, since every spec starts from it. */
export function emptyImage(): Promise<Uint8Array> {
  migratedImage ??= (async () => {
    const database = await EmbeddedDatabase.open();
    await database.dataSource.runMigrations({ transaction: 'each' });
    const image = database.exportImage();
    await database.close();
    return image;
  })();
  return migratedImage;
}

/** A fresh migrated database that is in memory only, behind the same queue as the real one. */
export async function memoryQueue(options: Partial<WriteQueueOptions> = {}): Promise<WriteQueue> {
  const image = await emptyImage();
  const database = await EmbeddedDatabase.open(image);
  return new WriteQueue(database, { save: () => Promise.resolve(), durableImage: image, ...options });
}
