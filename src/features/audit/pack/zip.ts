import { deflateRawSync } from 'node:zlib';

export interface ZipEntry {
  name: string;
  content: string;
}

// PKWARE APPNOTE 6.3.10: version 2.0 is enough for deflate; bit 11 says that names are UTF-8.
const version = 20;
const utf8Names = 0x0800;
const deflated = 8;

const crcTable = Uint32Array.from({ length: 256 }, (_, byte) => {
  let value = byte;
  for (let bit = 0; bit < 8; bit++) value = value & 1 ? (value >>> 1) ^ 0xedb88320 : value >>> 1;
  return value >>> 0;
});

function checksum(bytes: Buffer): number {
  let value = 0xffffffff;
  for (const byte of bytes) value = (crcTable[(value ^ byte) & 0xff] ?? 0) ^ (value >>> 8);
  return (value ^ 0xffffffff) >>> 0;
}

/** Date and time as DOS keeps them, in UTC, so that the same pack has the same bytes wherever it is made. */
function dosMoment(at: number): { time: number; date: number } {
  const moment = new Date(at);
  return {
    time: (moment.getUTCHours() << 11) | (moment.getUTCMinutes() << 5) | (moment.getUTCSeconds() >> 1),
    date: ((moment.getUTCFullYear() - 1980) << 9) | ((moment.getUTCMonth() + 1) << 5) | moment.getUTCDate(),
  };
}

function fields(...parts: readonly [size: 2 | 4, value: number][]): Buffer {
  const buffer = Buffer.alloc(parts.reduce((sum, [size]) => sum + size, 0));
  let place = 0;
  for (const [size, value] of parts) place = buffer.writeUIntLE(value, place, size);
  return buffer;
}

/** A zip of text files, none of them near the 4 GB where another format begins. */
export function writeZip(entries: readonly ZipEntry[], at: number): Buffer {
  const { time, date } = dosMoment(at);
  const bodies: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const { name, content } of entries) {
    const bytes = Buffer.from(content, 'utf8');
    const packed = deflateRawSync(bytes, { level: 9 });
    const title = Buffer.from(name, 'utf8');
    const shared = fields(
      [2, version],
      [2, utf8Names],
      [2, deflated],
      [2, time],
      [2, date],
      [4, checksum(bytes)],
      [4, packed.length],
      [4, bytes.length],
      [2, title.length],
      [2, 0],
    );
    const local = Buffer.concat([fields([4, 0x04034b50]), shared, title, packed]);
    const rest = fields([2, 0], [2, 0], [2, 0], [4, 0], [4, offset]);
    directory.push(fields([4, 0x02014b50], [2, version]), shared, rest, title);
    bodies.push(local);
    offset += local.length;
  }
  const listing = Buffer.concat(directory);
  const end = fields(
    [4, 0x06054b50],
    [2, 0],
    [2, 0],
    [2, entries.length],
    [2, entries.length],
    [4, listing.length],
    [4, offset],
    [2, 0],
  );
  return Buffer.concat([...bodies, listing, end]);
}
