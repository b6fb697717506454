import zlib from 'node:zlib';
import sharp from 'sharp';
import { aPicture, aPngThatDeclares, anIsoFile } from './pictures.ts';

/** What becomes of a picture that is sent: taken with an upright size, or refused with a status and words. */
export type Fate = { taken: [width: number, height: number] } | { refused: number; words: RegExp };

export interface OddPicture {
  what: string;
  make: () => Promise<Buffer> | Buffer;
  fate: Fate;
  /** The name and the type it is sent under. */
  name?: string;
  type?: string;
}

const taken = (width = 800, height = 600): Fate => ({ taken: [width, height] });
const refused = (status: number, words: RegExp): Fate => ({ refused: status, words });
const notRead = refused(415, /not a picture/);
const broken = refused(415, /cut off or damaged/);
const drawn = refused(415, /drawing or a web page/);

const half = async (b: Promise<Buffer>) => (await b).subarray(0, Math.floor((await b).length / 2));
const noise = (length: number, seed = 1): Buffer => {
  let s = seed;
  return Buffer.from(Uint8Array.from({ length }, () => (s = (Math.imul(s, 1664525) + 1013904223) >>> 0) >>> 24));
};
const from = (hex: string, rest = 4096) => Buffer.concat([Buffer.from(hex, 'hex'), Buffer.alloc(rest, 0x5a)]);
const flat = (width: number, height: number, channels: 3 | 4 = 3) => sharp({ create: { width, height, channels, background: { r: 150, g: 150, b: 150, alpha: 0.5 } } });

/** Our corpus of odd and hostile pictures, each with its fate. */
export const oddPictures: OddPicture[] = [
  // Not pictures, or of a kind that is not taken.
  { what: 'an empty file', make: () => Buffer.alloc(0), fate: refused(415, /empty/) },
  { what: 'a single byte', make: () => Buffer.from([0xff]), fate: notRead },
  { what: 'words under a picture’s name', make: () => Buffer.from('A shopping list, not a photo. '.repeat(40)), fate: notRead },
  { what: 'noise', make: () => noise(20_000), fate: notRead },
  { what: 'a drawing with a program in it', make: () => Buffer.from('<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"><script>alert(1)</script></svg>'), fate: drawn },
  { what: 'a drawing that calls out', make: () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><image href="http://127.0.0.1:9/x.png"/></svg>'), fate: drawn, name: 'wall.png', type: 'image/png' },
  { what: 'a drawing of entities within entities', make: () => Buffer.from(`<?xml version="1.0"?><!DOCTYPE s [<!ENTITY a "aaaaaaaaaa">${[...'bcdefgh'].map((c, i) => `<!ENTITY ${c} "${`&${'abcdefg'[i]};`.repeat(10)}">`).join('')}]><svg>&h;</svg>`), fate: drawn },
  { what: 'a web page', make: () => Buffer.from('  <!DOCTYPE html><html><script>alert(1)</script></html>'), fate: drawn },
  { what: 'a GIF', make: () => aPicture({ format: 'gif' }), fate: refused(415, /GIF/) },
  { what: 'a TIFF', make: () => aPicture({ format: 'tiff' }), fate: refused(415, /TIFF/) },
  { what: 'a raw camera file', make: () => from('4d4d002a00000008'), fate: refused(415, /raw camera/), name: 'photo.dng' },
  { what: 'an AVIF', make: () => aPicture({ format: 'avif', width: 300, height: 300 }), fate: refused(415, /AVIF/) },
  { what: 'a phone’s HEIC', make: () => anIsoFile('heic'), fate: refused(415, /HEIC.*JPEG/) },
  { what: 'a HEIC of another brand, sent as a JPEG', make: () => anIsoFile('mif1'), fate: refused(415, /HEIC.*JPEG/), name: 'photo.jpg', type: 'image/jpeg' },
  { what: 'a film', make: () => anIsoFile('isom'), fate: refused(415, /film/) },
  { what: 'a BMP', make: () => from('424d38000000'), fate: refused(415, /BMP/) },
  { what: 'an icon', make: () => from('00000100010010100000'), fate: notRead },
  { what: 'a JPEG 2000', make: () => from('0000000c6a5020200d0a870a'), fate: notRead },
  { what: 'a painting program’s file', make: () => from('3842505300010000'), fate: notRead },
  { what: 'a PDF', make: () => Buffer.from('%PDF-1.7\n%âãÏÓ\n1 0 obj'), fate: refused(415, /PDF/) },
  { what: 'an archive', make: () => from('504b0304140000000800'), fate: notRead, name: 'photo.jpg' },
  { what: 'a packed file that swells a thousandfold', make: () => zlib.gzipSync(Buffer.alloc(30e6)), fate: notRead },
  { what: 'a program', make: () => from('7f454c4602010100'), fate: notRead, name: 'photo.jpeg', type: 'image/jpeg' },
  { what: 'a sound', make: () => Buffer.concat([Buffer.from('RIFF\x24\x08\0\0WAVEfmt ', 'latin1'), Buffer.alloc(4096)]), fate: notRead },
  // Broken.
  { what: 'a JPEG cut off half way', make: () => half(aPicture({ width: 1600, height: 1200 })), fate: broken },
  { what: 'a JPEG of two bytes more than its mark', make: () => Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0]), fate: broken },
  { what: 'a JPEG’s mark and then noise', make: () => Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe1]), noise(5000, 7)]), fate: broken },
  { what: 'a JPEG without its tables', make: async () => without(await aPicture(), 0xdb), fate: broken },
  { what: 'a progressive JPEG cut off in its first scan', make: async () => (await sharp(noise(900 * 700 * 3), { raw: { width: 900, height: 700, channels: 3 } }).jpeg({ progressive: true }).toBuffer()).subarray(0, 4000), fate: broken },
  { what: 'a PNG cut off half way', make: () => half(aPicture({ format: 'png', width: 1600, height: 1200 })), fate: broken },
  { what: 'a PNG with a wrong check sum over its pixels', make: async () => { const b = await aPicture({ format: 'png' }); b[b.length - 20]! ^= 0xff; return b; }, fate: broken },
  { what: 'a PNG that ends after its header', make: async () => (await aPicture({ format: 'png' })).subarray(0, 33), fate: broken },
  { what: 'a PNG of no width', make: () => aPngThatDeclares(0, 600), fate: broken },
  { what: 'a PNG that declares more than it holds', make: () => aPngThatDeclares(7000, 7000), fate: broken },
  { what: 'a WebP cut off half way', make: () => half(aPicture({ format: 'webp', width: 1600, height: 1200 })), fate: broken },
  { what: 'a WebP of nothing but its mark', make: () => Buffer.from('RIFF\x10\0\0\0WEBPVP8 \0\0\0\0', 'latin1'), fate: broken },
  // Of a size that is not taken, told before any of it is decoded.
  { what: 'a PNG that declares four thousand megapixels', make: () => aPngThatDeclares(65_000, 65_000), fate: refused(413, /at most 60/) },
  { what: 'a PNG that declares just over sixty megapixels', make: () => aPngThatDeclares(10_000, 6001), fate: refused(413, /at most 60/) },
  { what: 'a JPEG that declares four thousand megapixels', make: async () => aJpegThatDeclares(await aPicture(), 65_500, 65_500), fate: refused(413, /at most 60/) },
  { what: 'a WebP that declares 268 megapixels', make: async () => aWebpThatDeclares(await aPicture({ format: 'webp' }), 16_383, 16_383), fate: refused(413, /at most 60/) },
  { what: 'a thumbnail', make: () => aPicture({ width: 120, height: 90 }), fate: refused(400, /too small/) },
  { what: 'a single pixel', make: () => flat(1, 1).png().toBuffer(), fate: refused(400, /too small/) },
  { what: 'a strip 4000 px long and 199 high', make: () => flat(4000, 199).jpeg().toBuffer(), fate: refused(400, /too small/) },
  { what: 'more than 40 MB', make: () => Buffer.alloc(40 * 1024 * 1024 + 1, 0xff), fate: refused(413, /larger than 40 MB/) },
  // Odd, and taken.
  { what: 'a JPEG with noise in its middle, over which any decoder reads', make: async () => { const b = Buffer.from(await sharp(noise(800 * 600 * 3), { raw: { width: 800, height: 600, channels: 3 } }).jpeg().toBuffer()); noise(30_000, 9).copy(b, b.length / 2); return b; }, fate: taken() },
  { what: 'a JPEG under a PNG’s name and type', make: () => aPicture(), fate: taken(), name: 'photo.png', type: 'image/png' },
  { what: 'a PNG without an ending', make: () => aPicture({ format: 'png' }), fate: taken(), name: 'photo', type: 'application/octet-stream' },
  { what: 'a photo named to climb out of its folder', make: () => aPicture(), fate: taken(), name: '../../../../etc/outside.jpg' },
  { what: 'a photo with a long name in other letters', make: () => aPicture(), fate: taken(), name: `${'стена壁🧱'.repeat(20)}.jpg` },
  { what: 'a progressive JPEG', make: async () => sharp(await aPicture()).jpeg({ progressive: true }).toBuffer(), fate: taken() },
  { what: 'a JPEG in four printing inks', make: async () => sharp(await aPicture()).toColourspace('cmyk').jpeg().toBuffer(), fate: taken() },
  { what: 'a grey JPEG', make: async () => sharp(await aPicture()).greyscale().jpeg().toBuffer(), fate: taken() },
  { what: 'a JPEG with a colour profile', make: async () => sharp(await aPicture()).withIccProfile('p3').jpeg().toBuffer(), fate: taken() },
  { what: 'a JPEG that tells where it was taken', make: () => aPicture({ gps: true }), fate: taken() },
  { what: 'a JPEG with an archive behind it', make: async () => Buffer.concat([await aPicture(), from('504b0304140000000800'), Buffer.from('Invented archive')]), fate: taken() },
  { what: 'a JPEG with a web page in its comment', make: async () => commented(await aPicture(), '<html><script>alert("Invented")</script></html>'), fate: taken() },
  { what: 'a JPEG with an orientation that is none', make: () => aPicture({ orientation: 6 }).then((b) => withOrientation(b, 6, 9)), fate: taken() },
  { what: 'a JPEG whose camera’s notes are noise', make: async () => withExifBlock(await aPicture(), noise(3000, 5)), fate: taken() },
  { what: 'a JPEG turned twice: rows and columns', make: () => aPicture({ orientation: 7 }), fate: taken(600, 800) },
  { what: 'a PNG of 16 bits a channel', make: async () => sharp(await aPicture()).toColourspace('rgb16').png().toBuffer(), fate: taken() },
  { what: 'a PNG of few colours', make: async () => sharp(await aPicture()).png({ palette: true, colours: 4 }).toBuffer(), fate: taken() },
  { what: 'a PNG woven in seven passes', make: async () => sharp(await aPicture()).png({ progressive: true }).toBuffer(), fate: taken() },
  { what: 'a PNG half seen through', make: () => flat(400, 300, 4).png().toBuffer(), fate: taken(400, 300) },
  { what: 'a PNG with a text that swells to 60 MB', make: async () => withChunk(await aPicture({ format: 'png' }), 'zTXt', Buffer.concat([Buffer.from('Invented\0\0', 'latin1'), zlib.deflateSync(Buffer.alloc(60e6, 0x41))])), fate: taken() },
  { what: 'a WebP without loss, half seen through', make: () => flat(400, 300, 4).webp({ lossless: true }).toBuffer(), fate: taken(400, 300) },
  { what: 'a WebP that moves', make: () => sharp(noise(300 * 600 * 3), { raw: { width: 300, height: 600, channels: 3, pageHeight: 300 } }).webp({ loop: 0, delay: [100, 100] }).toBuffer(), fate: taken(300, 300) },
  { what: 'a strip 9000 px long', make: () => flat(9000, 220).jpeg().toBuffer(), fate: taken(9000, 220) },
  { what: 'sixty megapixels to the last, of one colour', make: () => flat(10_000, 6000).png().toBuffer(), fate: taken(10_000, 6000) },
];

/** Walks a JPEG's segments (ITU T.81, annex B) up to the scan: place, kind and length of each. */
function segments(jpeg: Buffer): { at: number; kind: number; length: number }[] {
  const found = [];
  for (let at = 2; at + 4 <= jpeg.length && jpeg[at] === 0xff; ) {
    const kind = jpeg[at + 1]!;
    const length = jpeg.readUInt16BE(at + 2) + 2;
    found.push({ at, kind, length });
    if (kind === 0xda) break;
    at += length;
  }
  return found;
}

function without(jpeg: Buffer, kind: number): Buffer {
  const gone = segments(jpeg).filter((s) => s.kind === kind);
  return Buffer.concat([...gone.map((s, i) => jpeg.subarray(i === 0 ? 0 : gone[i - 1]!.at + gone[i - 1]!.length, s.at)), jpeg.subarray(gone.at(-1)!.at + gone.at(-1)!.length)]);
}

function aJpegThatDeclares(jpeg: Buffer, width: number, height: number): Buffer {
  const frame = segments(jpeg).find((s) => s.kind >= 0xc0 && s.kind <= 0xc2)!;
  jpeg.writeUInt16BE(height, frame.at + 5);
  jpeg.writeUInt16BE(width, frame.at + 7);
  return jpeg;
}

/** A lossy WebP's frame header (RFC 6386, 9.1): start code 9d 01 2a, then width and height of 14 bits. */
function aWebpThatDeclares(webp: Buffer, width: number, height: number): Buffer {
  const at = webp.indexOf(Buffer.from([0x9d, 0x01, 0x2a]));
  webp.writeUInt16LE(width, at + 3);
  webp.writeUInt16LE(height, at + 5);
  return webp;
}

function withSegment(jpeg: Buffer, kind: number, body: Buffer): Buffer {
  const head = Buffer.from([0xff, kind, 0, 0]);
  head.writeUInt16BE(body.length + 2, 2);
  return Buffer.concat([jpeg.subarray(0, 2), head, body, jpeg.subarray(2)]);
}

const commented = (jpeg: Buffer, words: string) => withSegment(jpeg, 0xfe, Buffer.from(words));
const withExifBlock = (jpeg: Buffer, body: Buffer) => withSegment(jpeg, 0xe1, Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), body]));

/** Writes another orientation into the Exif entry 0x0112 (type SHORT, count 1), whichever its byte order. */
function withOrientation(jpeg: Buffer, before: number, after: number): Buffer {
  const little = jpeg.indexOf(Buffer.from([0x12, 0x01, 0x03, 0x00, 0x01, 0x00, 0x00, 0x00, before]));
  const big = jpeg.indexOf(Buffer.from([0x01, 0x12, 0x00, 0x03, 0x00, 0x00, 0x00, 0x01, 0x00, before]));
  if (little < 0 && big < 0) throw new Error('The picture has no orientation to change.');
  if (little >= 0) jpeg[little + 8] = after;
  else jpeg[big + 9] = after;
  return jpeg;
}

/** Puts a chunk behind a PNG's header. */
function withChunk(png: Buffer, kind: string, body: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(kind, 'latin1'), body]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(body.length);
  const sum = Buffer.alloc(4);
  sum.writeUInt32BE(zlib.crc32(named));
  return Buffer.concat([png.subarray(0, 33), length, named, sum, png.subarray(33)]);
}
