/** A stored record on its way out: as its packed bytes, or row by row as CSV. */
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { promisify } from 'node:util'
import { gunzip } from 'node:zlib'
import type { Request, Response } from 'express'
import type { Run } from '#server/db/models/run.ts'
import { csvChunks, downloadName } from '#server/features/runs/csv.ts'
import { layoutOf } from '#server/features/runs/present.ts'
import { decodeColumns } from '#shared/record-codec.ts'

interface StoredRecord {
  row: Run
  /** gzip of `shared/record-codec.ts`. */
  bytes: Buffer
}

const unpack = promisify(gunzip)

/**
 * Sends the bytes as they are stored, or unpacked to a client that takes no gzip. A run never changes, so its tag is
 * its id and the moment of its making; a browser may keep it but asks again, so that signing out counts.
 */
export async function sendRecord(
  request: Request,
  response: Response,
  { row, bytes }: StoredRecord,
): Promise<void> {
  const packed = request.acceptsEncodings('gzip') === 'gzip'
  response.set({
    'Cache-Control': 'private, no-cache, no-transform',
    ETag: `"run-${row.id}-${row.createdAt.getTime()}${packed ? '-gzip' : ''}"`,
    Vary: 'Accept-Encoding',
  })
  if (request.fresh) {
    response.status(304).end()
    return
  }
  if (packed) response.set('Content-Encoding', 'gzip')
  response.type('application/octet-stream').send(packed ? bytes : await unpack(bytes))
}

/** Streams the record as CSV, no faster than the client reads; the download is named after the run's title. */
export async function sendCsv(response: Response, { row, bytes }: StoredRecord): Promise<void> {
  const layout = layoutOf(row)
  const { buffer } = Uint8Array.from(await unpack(bytes))
  const columns = decodeColumns(buffer, layout.columns.length)
  response.attachment(downloadName(row.title, row.id)).type('text/csv')
  await pipeline(Readable.from(csvChunks(layout, columns)), response).catch(
    (error: NodeJS.ErrnoException) => {
      // The reader left in the middle: nobody is there to be told.
      if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error
    },
  )
}
