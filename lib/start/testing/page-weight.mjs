// @ts-check
import http from 'node:http'

/**
 * Asks as a browser does, compressed, and counts what comes over the wire.
 * @param {URL} address
 * @returns {Promise<{ status: number, bytes: number, body: Buffer }>}
 */
function download(address) {
  return new Promise((resolve, reject) => {
    http
      .get(address, { headers: { 'accept-encoding': 'gzip' } }, (answer) => {
        /** @type {Buffer[]} */
        const parts = []
        answer.on('data', (part) => parts.push(part))
        answer.once('end', () => {
          const body = Buffer.concat(parts)
          resolve({ status: answer.statusCode ?? 0, bytes: body.length, body })
        })
        answer.once('error', reject)
      })
      .once('error', reject)
  })
}

/**
 * Script that the first page loads before anything is clicked.
 * @param {string} address of the application
 * @param {string} page
 * @returns {Promise<{ files: number, kilobytes: number }>} compressed, as sent; kilobytes of 1000 bytes
 */
export async function scriptsOf(address, page) {
  const html = await fetch(new URL(page, address)).then((answer) => answer.text())
  // what is kept for browsers without modules is not loaded by others
  const tags = [...html.matchAll(/<script\b[^>]*>/g)].map(([tag]) => tag).filter((tag) => !/\bnomodule\b/i.test(tag))
  const sources = new Set(tags.flatMap((tag) => /\bsrc="([^"]+)"/.exec(tag)?.slice(1) ?? []))
  let bytes = 0
  for (const source of sources) {
    const { status, bytes: sent } = await download(new URL(source.replaceAll('&amp;', '&'), address))
    if (status !== 200) throw new Error(`${source} of ${page} answers ${status}`)
    bytes += sent
  }
  return { files: sources.size, kilobytes: bytes / 1000 }
}
