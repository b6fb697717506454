import zlib from 'node:zlib';
import sharp from 'sharp';

export const red = '#c81e1e';
export const green = '#1e961e';

/** A grey picture whose stored upper left corner is red and upper right corner green. */
export async function aPicture({ width = 800, height = 600, orientation, gps = false, format = 'jpeg' as 'jpeg' | 'png' | 'webp' | 'gif' | 'tiff' | 'avif' } = {} as {
  width?: number; height?: number; orientation?: number; gps?: boolean; format?: 'jpeg' | 'png' | 'webp' | 'gif' | 'tiff' | 'avif';
}): Promise<Buffer> {
  const block = (background: string) => ({ create: { width: Math.floor(width / 4), height: Math.floor(height / 4), channels: 3 as const, background } });
  let picture = sharp({ create: { width, height, channels: 3, background: '#a0a0a0' } })
    .composite([{ input: block(red), gravity: 'northwest' }, { input: block(green), gravity: 'northeast' }]);
  if (gps) picture = picture.withExif({ IFD0: { Make: 'Invented', Model: 'Box' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1', GPSLongitudeRef: 'W', GPSLongitude: '0/1 7/1 0/1' } });
  if (orientation) picture = picture.withMetadata({ orientation });
  return picture.toFormat(format).toBuffer();
}

/** A PNG that declares a size far beyond what it holds. */
export async function aPngThatDeclares(width: number, height: number): Promise<Buffer> {
  const png = await aPicture({ format: 'png', width: 300, height: 300 });
  png.writeUInt32BE(width, 16);
  png.writeUInt32BE(height, 20);
  png.writeUInt32BE(zlib.crc32 ? zlib.crc32(png.subarray(12, 29)) : crc32(png.subarray(12, 29)), 29);
  return png;
}

/** The first bytes of an ISO media file of a brand, as cameras write them, and then nothing to read. */
export function anIsoFile(brand: string): Buffer {
  return Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from(`ftyp${brand}\0\0\0\0${brand}mif1`, 'latin1'), Buffer.alloc(4096)]);
}

/** CRC of PNG chunks (PNG specification, annex D). */
function crc32(bytes: Uint8Array): number {
  let c = 0xffffffff;
  for (const byte of bytes) {
    c ^= byte;
    for (let k = 0; k < 8; k++) c = c & 1 ? 0xedb88320 ^ (c >>> 1) : c >>> 1;
  }
  return (c ^ 0xffffffff) >>> 0;
}
