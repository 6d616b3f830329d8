/** A size in bytes as text: '812 bytes', '12.3 kB', '8.4 MB'. Thousands are 1024, as the limits of uploads are. */
export function fileSize(bytes: number): string {
  if (bytes < 1024) return `${bytes}\u00A0${bytes === 1 ? "byte" : "bytes"}`;
  const kilobytes = bytes / 1024;
  return kilobytes < 1023.95 ? `${kilobytes.toFixed(1)}\u00A0kB` : `${(kilobytes / 1024).toFixed(1)}\u00A0MB`;
}
