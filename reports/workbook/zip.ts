import { crc32, deflateRawSync, inflateRawSync } from 'node:zlib';

/** A file inside an archive. */
export interface ZipEntry {
  name: string;
  content: Buffer;
}

const LOCAL = 0x04034b50;
const CENTRAL = 0x02014b50;
const END = 0x06054b50;
/** 1 January 1980, the first date the format knows: the same files give the same bytes. */
const DOS_DATE = 0x0021;

/** Reads all files of an archive that has no encryption and no 64-bit sizes. */
export function readZip(archive: Buffer): ZipEntry[] {
  const end = archive.lastIndexOf(Buffer.from([0x50, 0x4b, 0x05, 0x06]));
  if (end < 0) throw new Error('not a zip archive');
  const count = archive.readUInt16LE(end + 10);
  let at = archive.readUInt32LE(end + 16);
  const entries: ZipEntry[] = [];
  for (let i = 0; i < count; i += 1) {
    if (archive.readUInt32LE(at) !== CENTRAL) throw new Error('broken zip directory');
    const method = archive.readUInt16LE(at + 10);
    const size = archive.readUInt32LE(at + 20);
    const nameLength = archive.readUInt16LE(at + 28);
    const local = archive.readUInt32LE(at + 42);
    const name = archive.toString('utf8', at + 46, at + 46 + nameLength);
    const start = local + 30 + archive.readUInt16LE(local + 26) + archive.readUInt16LE(local + 28);
    const packed = archive.subarray(start, start + size);
    if (!name.endsWith('/')) entries.push({ name, content: method === 0 ? packed : inflateRawSync(packed) });
    at += 46 + nameLength + archive.readUInt16LE(at + 30) + archive.readUInt16LE(at + 32);
  }
  return entries;
}

/** Writes files in the given order with one fixed date, so that equal files are equal bytes. */
export function writeZip(entries: readonly ZipEntry[]): Buffer {
  const parts: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const { name, content } of entries) {
    const path = Buffer.from(name, 'utf8');
    const packed = deflateRawSync(content, { level: 6 });
    const common = Buffer.alloc(26);
    common.writeUInt16LE(20, 0); // version needed
    common.writeUInt16LE(0x0800, 2); // names are UTF-8
    common.writeUInt16LE(8, 4); // deflate
    common.writeUInt16LE(0, 6);
    common.writeUInt16LE(DOS_DATE, 8);
    common.writeUInt32LE(crc32(content), 10);
    common.writeUInt32LE(packed.length, 14);
    common.writeUInt32LE(content.length, 18);
    common.writeUInt16LE(path.length, 22);
    parts.push(word(LOCAL), common, path, packed);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(offset, 10);
    directory.push(word(CENTRAL), Buffer.from([20, 0]), common, tail, path);
    offset += 30 + path.length + packed.length;
  }
  const central = Buffer.concat(directory);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(entries.length, 4);
  end.writeUInt16LE(entries.length, 6);
  end.writeUInt32LE(central.length, 8);
  end.writeUInt32LE(offset, 12);
  return Buffer.concat([...parts, central, word(END), end]);
}

function word(value: number): Buffer {
  const buffer = Buffer.alloc(4);
  buffer.writeUInt32LE(value);
  return buffer;
}
