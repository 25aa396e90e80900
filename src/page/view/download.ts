export function downloadText(name: string, text: string, type = 'text/plain'): void {
  downloadBlob(name, new Blob([text], { type }))
}

export function downloadBlob(name: string, blob: Blob): void {
  const link = document.createElement('a')
  link.href = URL.createObjectURL(blob)
  link.download = name
  link.click()
  // The download has its own hold on the bytes once it has begun.
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000)
}
