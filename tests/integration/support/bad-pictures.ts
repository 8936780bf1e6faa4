import { crc32, deflateSync } from 'node:zlib';

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(data.length, 0);
  frame.writeUInt32BE(crc32(body), 4);
  return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)]);
}

/** A well-formed head of a PNG (PNG specification, section 11.2.2) that declares any size, with hardly a pixel behind it. */
export function pngDeclaring(widthPx: number, heightPx: number): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(widthPx, 0);
  head.writeUInt32BE(heightPx, 4);
  head.set([8, 2, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', head),
    chunk('IDAT', deflateSync(Buffer.alloc(1000))),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** Two frames of 8 × 8 pixels as an animated PNG: an acTL chunk before the picture is what tells it apart. */
export function animatedPng(stillPng: Buffer): Buffer {
  const control = Buffer.alloc(8);
  control.writeUInt32BE(2, 0);
  const afterHead = 8 + 25;
  return Buffer.concat([stillPng.subarray(0, afterHead), chunk('acTL', control), stillPng.subarray(afterHead)]);
}
