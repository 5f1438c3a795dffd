import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startEmbedded } from '../../platform/embedded/start-embedded.ts';

export interface ThrowAwayDatabase {
  /** The data folder of this run. */
  folder: string;
  ownerUrl: string;
  /** Stops the server and removes all that was kept. */
  remove(): Promise<void>;
}

/** A database for one run: nothing is flushed to the disk, nothing stays behind. */
export async function throwAwayDatabase(log: (line: string) => void): Promise<ThrowAwayDatabase> {
  const folder = mkdtempSync(join(tmpdir(), 'loadweir-demo-'));
  // As root the server runs under another account, which has to pass through; files in here are closed one by one.
  chmodSync(folder, 0o711);
  try {
    const database = await startEmbedded({ dataDir: folder, durable: false, log });
    const remove = async () => {
      await database.stop();
      rmSync(database.dataDir, { recursive: true, force: true });
      rmSync(folder, { recursive: true, force: true });
    };
    return { folder, ownerUrl: database.ownerUrl, remove };
  } catch (error) {
    rmSync(folder, { recursive: true, force: true });
    throw error;
  }
}
