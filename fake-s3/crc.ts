// Cyclic redundancy checks in reflected form, table by table, fed in pieces. Parameters and check values:
// the catalogue of parametrised CRC algorithms (CRC-32/ISO-HDLC, CRC-32/ISCSI, CRC-64/NVME).

/** A running check: `update` with bytes as they pass, `digest` gives big-endian bytes. */
export type RunningChecksum = { update(bytes: Uint8Array): unknown; digest(): Buffer };

const CRC32_POLYNOMIAL = 0xedb88320;
const CRC32C_POLYNOMIAL = 0x82f63b78;
const CRC64_NVME_POLYNOMIAL = 0x9a6c9329ac4bc9b5n;

/** CRC-32 as in zip files and Ethernet. */
export const crc32 = (): RunningChecksum => runningCrc32(CRC32_TABLE);
/** CRC-32C (Castagnoli). */
export const crc32c = (): RunningChecksum => runningCrc32(CRC32C_TABLE);

const CRC32_TABLE = table32(CRC32_POLYNOMIAL);
const CRC32C_TABLE = table32(CRC32C_POLYNOMIAL);
const CRC64_TABLE = table64(CRC64_NVME_POLYNOMIAL);

function table32(polynomial: number): Uint32Array {
  return Uint32Array.from({ length: 256 }, (_, index) => {
    let value = index;
    for (let bit = 0; bit < 8; bit++) value = value & 1 ? (value >>> 1) ^ polynomial : value >>> 1;
    return value >>> 0;
  });
}

function runningCrc32(table: Uint32Array): RunningChecksum {
  let state = -1;
  return {
    update(bytes) {
      for (const byte of bytes) state = (state >>> 8) ^ (table[(state ^ byte) & 0xff] as number);
    },
    digest() {
      const out = Buffer.alloc(4);
      out.writeInt32BE(~state);
      return out;
    },
  };
}

/** Halves of the 64-bit table: BigInt arithmetic a byte would be a hundred times slower. */
function table64(polynomial: bigint): { high: Uint32Array; low: Uint32Array } {
  const high = new Uint32Array(256);
  const low = new Uint32Array(256);
  for (let index = 0; index < 256; index++) {
    let value = BigInt(index);
    for (let bit = 0; bit < 8; bit++) value = value & 1n ? (value >> 1n) ^ polynomial : value >> 1n;
    high[index] = Number(value >> 32n);
    low[index] = Number(value & 0xffffffffn);
  }
  return { high, low };
}

/** CRC-64/NVME. */
export function crc64nvme(): RunningChecksum {
  let high = -1;
  let low = -1;
  return {
    update(bytes) {
      for (const byte of bytes) {
        const index = (low ^ byte) & 0xff;
        low = ((low >>> 8) | (high << 24)) ^ (CRC64_TABLE.low[index] as number);
        high = (high >>> 8) ^ (CRC64_TABLE.high[index] as number);
      }
    },
    digest() {
      const out = Buffer.alloc(8);
      out.writeInt32BE(~high, 0);
      out.writeInt32BE(~low, 4);
      return out;
    },
  };
}
