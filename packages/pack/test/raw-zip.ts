// Builds zips by hand, so that tests can lie in any field of them.
import { deflateRawSync } from 'node:zlib';
import { crc32 } from '../src/crc32.ts';

export interface RawEntry {
  readonly name: string;
  readonly content?: string | Uint8Array;
  readonly localName?: string;
  readonly method?: number;
  readonly flags?: number;
  readonly mode?: number;
  readonly size?: number;
  readonly crc?: number;
}

/** A zip of the entries, each field true unless an entry says otherwise. */
export function rawZip(entries: readonly RawEntry[], countStated: number = entries.length): Uint8Array {
  const parts: Buffer[] = [];
  const central: Buffer[] = [];
  let at = 0;
  for (const entry of entries) {
    const content = Buffer.from(entry.content ?? 'content');
    const method = entry.method ?? 8;
    const packed = method === 8 ? deflateRawSync(content) : content;
    const localName = Buffer.from(entry.localName ?? entry.name);
    const local = Buffer.alloc(30);
    local.writeUInt32LE(0x04034b50, 0);
    local.writeUInt16LE(localName.length, 26);
    const name = Buffer.from(entry.name);
    const header = Buffer.alloc(46);
    header.writeUInt32LE(0x02014b50, 0);
    header.writeUInt16LE(entry.flags ?? 0, 8);
    header.writeUInt16LE(method, 10);
    header.writeUInt32LE(entry.crc ?? crc32(content), 16);
    header.writeUInt32LE(packed.length, 20);
    header.writeUInt32LE(entry.size ?? content.length, 24);
    header.writeUInt16LE(name.length, 28);
    header.writeUInt32LE(((entry.mode ?? 0) * 0x10000) >>> 0, 38);
    header.writeUInt32LE(at, 42);
    parts.push(local, localName, packed);
    central.push(header, name);
    at += local.length + localName.length + packed.length;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(22);
  end.writeUInt32LE(0x06054b50, 0);
  end.writeUInt16LE(countStated, 8);
  end.writeUInt16LE(countStated, 10);
  end.writeUInt32LE(directory.length, 12);
  end.writeUInt32LE(at, 16);
  return new Uint8Array(Buffer.concat([...parts, directory, end]));
}
