/**
 * The check sums of a zip, which the unpacking library leaves aside. A photograph or a figure that changed in a
 * failing store would otherwise pass unseen.
 *
 * Layout of the central directory: PKWARE, APPNOTE.TXT 4.3.12 and 4.3.16 (from memory).
 */
import { strFromU8 } from 'fflate';

const DIRECTORY_ENTRY = 0x02014b50;
const DIRECTORY_END = 0x06054b50;
const END_LENGTH = 22;
const ENTRY_LENGTH = 46;
const UTF8_NAME = 0x800;
/** In place of an offset that only the 64-bit record states. */
const IN_64_BIT_RECORD = 0xffffffff;

/**
 * CRC-32 of each file by its name, as the archive states it. Empty for an archive beyond 4 GB, whose directory lies
 * elsewhere; such a one is larger than any that is accepted.
 */
export function checkSumsOf(zip: Uint8Array): ReadonlyMap<string, number> {
  const view = new DataView(zip.buffer, zip.byteOffset, zip.byteLength);
  const sums = new Map<string, number>();
  let end = zip.length - END_LENGTH;
  while (end >= 0 && view.getUint32(end, true) !== DIRECTORY_END) end -= 1;
  if (end < 0) return sums;
  let at = view.getUint32(end + 16, true);
  if (at === IN_64_BIT_RECORD) return sums;
  while (at + ENTRY_LENGTH <= end && view.getUint32(at, true) === DIRECTORY_ENTRY) {
    const nameLength = view.getUint16(at + 28, true);
    const isLatin = (view.getUint16(at + 8, true) & UTF8_NAME) === 0;
    const name = strFromU8(zip.subarray(at + ENTRY_LENGTH, at + ENTRY_LENGTH + nameLength), isLatin);
    sums.set(name, view.getUint32(at + 16, true));
    at += ENTRY_LENGTH + nameLength + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
  }
  return sums;
}

const REMAINDERS = Uint32Array.from({ length: 256 }, (_, byte) => {
  let remainder = byte;
  for (let bit = 0; bit < 8; bit += 1) remainder = remainder & 1 ? (remainder >>> 1) ^ 0xedb88320 : remainder >>> 1;
  return remainder;
});

/** CRC-32 as zip uses it: polynomial 0x04c11db7 reflected, all ones before and after. */
export function checkSum(bytes: Uint8Array): number {
  let sum = 0xffffffff;
  for (let index = 0; index < bytes.length; index += 1) {
    sum = (sum >>> 8) ^ REMAINDERS[(sum ^ bytes[index]!) & 0xff]!;
  }
  return ~sum >>> 0;
}
