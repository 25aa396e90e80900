/** Prints a page of ours to PDF with the browser given: A4, page numbers at the foot, scripts off, no network. */
export async function printPdf(pageHtml: string, browserPath: string, footer: string): Promise<Buffer> {
  const { chromium } = await import('playwright-core')
  const browser = await chromium.launch({ executablePath: browserPath })
  try {
    const context = await browser.newContext({ javaScriptEnabled: false, offline: true })
    const page = await context.newPage()
    await page.setContent(pageHtml, { waitUntil: 'load' })
    return await page.pdf({
      format: 'A4',
      printBackground: true,
      displayHeaderFooter: true,
      headerTemplate: '<span></span>',
      footerTemplate: footerHtml(footer),
      preferCSSPageSize: false,
      tagged: true,
      outline: true,
      // As the page's style asks of a printer.
      margin: { top: '16mm', right: '16mm', bottom: '18mm', left: '16mm' },
    })
  } finally {
    await browser.close()
  }
}

/** `text` is HTML. */
function footerHtml(text: string): string {
  return `<div style="width: 100%; padding: 0 16mm; display: flex; justify-content: space-between; font: 7pt 'DejaVu Sans', Verdana, sans-serif; color: #555555"><span>${text}</span><span><span class="pageNumber"></span> / <span class="totalPages"></span></span></div>`
}
