import type { Browser, BrowserContextOptions, Page } from 'playwright-core'

export interface Visit {
  readonly page: Page
  /** Errors on the console and requests that went elsewhere or failed, as they come. */
  readonly complaints: readonly string[]
}

/** Opens an address in a fresh profile and writes down everything that should not happen. */
export async function visit(browser: Browser, address: string, options: BrowserContextOptions = {}): Promise<Visit> {
  const context = await browser.newContext({ viewport: { width: 1280, height: 900 }, ...options })
  const page = await context.newPage()
  const complaints: string[] = []
  const { origin } = new URL(address)
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(`console: ${message.text()}`)
  })
  page.on('pageerror', (error) => complaints.push(`error: ${error.message}`))
  page.on('requestfailed', (request) => complaints.push(`failed: ${request.url()}`))
  page.on('request', (request) => {
    const url = request.url()
    if (!url.startsWith(`${origin}/`) && !/^(data|blob):/.test(url)) complaints.push(`outside: ${url}`)
  })
  await page.goto(address)
  return { page, complaints }
}

/** The figure of the direction looked from, as shown. */
export async function figure(page: Page, metric: string): Promise<number> {
  return Number(await page.locator(`tr[data-metric="${metric}"] td`).first().textContent())
}

/** Until the engine has answered and the page drawn it. */
export async function shown(page: Page): Promise<void> {
  await page.locator('canvas[data-chart="cone"]').waitFor()
}
