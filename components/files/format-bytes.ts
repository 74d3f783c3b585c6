/** 812 bytes, 4.1 kB, 12.6 MB: decimal, as file managers show it. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`
  const [value, unit] = bytes < 1_000_000 ? [bytes / 1000, 'kB'] : [bytes / 1_000_000, 'MB']
  return `${value < 10 ? value.toFixed(1) : Math.round(value)} ${unit}`
}
