/**
 * The bytes of a stored record: its columns one after another, each `samples` IEEE 754 doubles, little endian. Names
 * and units stand in the run's `record` layout. The transport compresses; this does not.
 */
const bytesPerSample = Float64Array.BYTES_PER_ELEMENT

/** Columns of equal length → bytes. */
export function encodeColumns(columns: readonly Float64Array[]): Uint8Array {
  const samples = columns[0]?.length ?? 0
  if (columns.some((column) => column.length !== samples)) throw new RangeError('columns differ in length')
  const view = new DataView(new ArrayBuffer(columns.length * samples * bytesPerSample))
  let offset = 0
  for (const column of columns)
    for (const value of column) {
      view.setFloat64(offset, value, true)
      offset += bytesPerSample
    }
  return new Uint8Array(view.buffer)
}

/** Bytes → `count` columns of equal length. Throws a RangeError when the length does not fit. */
export function decodeColumns(bytes: ArrayBuffer, count: number): Float64Array[] {
  const samples = bytes.byteLength / count / bytesPerSample
  if (!Number.isInteger(samples)) throw new RangeError('the record is truncated')
  const view = new DataView(bytes)
  return Array.from({ length: count }, (_, index) =>
    Float64Array.from({ length: samples }, (_, i) =>
      view.getFloat64((index * samples + i) * bytesPerSample, true),
    ),
  )
}
