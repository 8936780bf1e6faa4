/** A file for the reader's disk: never shown in the page, never kept by a cache. `fileName` is plain ASCII of our making. */
export function download(fileName: string, mediaType: string, body: string | Uint8Array<ArrayBuffer>): Response {
  return new Response(body, {
    headers: {
      'content-type': mediaType,
      'content-disposition': `attachment; filename="${fileName.replace(/[^\w.-]+/g, '-')}"`,
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-store',
    },
  });
}
