import type { H3Event } from 'h3'

/** A PDF to look at in place; its name is for whoever keeps it. */
export function sendPdf(event: H3Event, bytes: Uint8Array, name: string): Buffer {
  return sendFile(event, bytes, 'application/pdf', name, 'inline')
}

/** A download: never run or shown as a page of ours. */
export function sendFile(event: H3Event, bytes: Uint8Array, type: string, name: string, how: 'inline' | 'attachment' = 'attachment'): Buffer {
  setResponseHeader(event, 'content-type', type)
  setResponseHeader(event, 'content-disposition', `${how}; filename="${name.replace(/[^\w.-]/g, '_')}"; filename*=UTF-8''${encodeURIComponent(name)}`)
  return Buffer.from(bytes)
}
