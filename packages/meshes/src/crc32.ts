/** Table of the CRC-32 polynomial of zip (reflected 0xEDB88320), eight slices for eight bytes a step. */
const TABLES = makeTables();

function makeTables(): readonly Uint32Array[] {
  const tables = Array.from({ length: 8 }, () => new Uint32Array(256));
  const first = tables[0]!;
  for (let byte = 0; byte < 256; byte += 1) {
    let value = byte;
    for (let bit = 0; bit < 8; bit += 1) value = (value & 1) !== 0 ? (value >>> 1) ^ 0xedb88320 : value >>> 1;
    first[byte] = value;
  }
  for (let slice = 1; slice < 8; slice += 1) {
    for (let byte = 0; byte < 256; byte += 1) {
      const below = tables[slice - 1]![byte]!;
      tables[slice]![byte] = (below >>> 8) ^ first[below & 255]!;
    }
  }
  return tables;
}

/** CRC-32 of `bytes`, carried on from `before` (0 at the start), as an unsigned number. */
export function crc32(bytes: Uint8Array, before = 0): number {
  const [t0, t1, t2, t3, t4, t5, t6, t7] = TABLES as [
    Uint32Array,
    Uint32Array,
    Uint32Array,
    Uint32Array,
    Uint32Array,
    Uint32Array,
    Uint32Array,
    Uint32Array,
  ];
  let value = ~before;
  let i = 0;
  for (; i + 8 <= bytes.length; i += 8) {
    value ^= bytes[i]! | (bytes[i + 1]! << 8) | (bytes[i + 2]! << 16) | (bytes[i + 3]! << 24);
    value =
      t7[value & 255]! ^
      t6[(value >>> 8) & 255]! ^
      t5[(value >>> 16) & 255]! ^
      t4[value >>> 24]! ^
      t3[bytes[i + 4]!]! ^
      t2[bytes[i + 5]!]! ^
      t1[bytes[i + 6]!]! ^
      t0[bytes[i + 7]!]!;
  }
  for (; i < bytes.length; i += 1) value = (value >>> 8) ^ t0[(value ^ bytes[i]!) & 255]!;
  return ~value >>> 0;
}
