/** Series as they lie in the database and travel to the client: little-endian floats, one after another. */
export function packFloat64(samples: Float64Array): Buffer {
  const packed = Buffer.allocUnsafe(samples.length * 8);
  samples.forEach((sample, i) => packed.writeDoubleLE(sample, i * 8));
  return packed;
}

export function packFloat32(samples: ArrayLike<number>): Buffer {
  const packed = Buffer.allocUnsafe(samples.length * 4);
  for (let i = 0; i < samples.length; i++) packed.writeFloatLE(samples[i] ?? NaN, i * 4);
  return packed;
}

export function unpackFloat64(packed: Buffer): Float64Array {
  return Float64Array.from({ length: packed.length / 8 }, (_, i) => packed.readDoubleLE(i * 8));
}

export function unpackFloat32(packed: Buffer): Float32Array {
  return Float32Array.from({ length: packed.length / 4 }, (_, i) => packed.readFloatLE(i * 4));
}
