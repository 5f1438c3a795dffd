import { startEmbedded } from '../../../src/platform/embedded/start-embedded.ts';

// A process that starts the database in the folder it is given, says so in one line and then only waits.
const database = await startEmbedded({ dataDir: process.argv[2] ?? '', durable: false });
process.stdout.write(`${JSON.stringify({ ownerUrl: database.ownerUrl, note: database.note })}\n`);
setInterval(() => undefined, 1000);
