/** 8-byte little-endian floats; null travels as NaN. */
export function packFloats(values: readonly (number | null)[]): Buffer {
  const buffer = Buffer.alloc(values.length * 8);
  values.forEach((value, index) => buffer.writeDoubleLE(value ?? Number.NaN, index * 8));
  return buffer;
}

export function unpackFloats(buffer: Buffer): (number | null)[] {
  return Array.from({ length: buffer.length / 8 }, (_, index) => {
    const value = buffer.readDoubleLE(index * 8);
    return Number.isNaN(value) ? null : value;
  });
}

/** 4-byte little-endian integers. */
export function packIntegers(values: readonly number[]): Buffer {
  const buffer = Buffer.alloc(values.length * 4);
  values.forEach((value, index) => buffer.writeUInt32LE(value, index * 4));
  return buffer;
}

export function unpackIntegers(buffer: Buffer): number[] {
  return Array.from({ length: buffer.length / 4 }, (_, index) => buffer.readUInt32LE(index * 4));
}
