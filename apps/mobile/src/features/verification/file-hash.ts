/** SHA-256 of a file as hexadecimal digits, computed in the browser: the file goes nowhere. */
export async function fileHash(file: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await file.arrayBuffer());
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
