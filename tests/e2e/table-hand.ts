import type { Page } from 'playwright-core'

type PlacePx = readonly [number, number]

/** A hand at the tracing table: places are photo pixels, put on the screen by the table's own view. */
export class TableHand {
  constructor(private readonly page: Page) {}

  get photo() {
    return this.page.getByRole('application')
  }

  async ready(): Promise<void> {
    await this.photo.waitFor()
    await this.page.waitForFunction(() => {
      const table = document.querySelector('[role="application"]')
      return Number(table?.getAttribute('data-scale')) > 0
    })
  }

  async take(tool: string): Promise<void> {
    await this.page.getByRole('button', { name: tool, exact: true }).first().click()
  }

  async click(place: PlacePx): Promise<void> {
    const [x, y] = await this.onScreen(place)
    await this.page.mouse.click(x, y)
  }

  async drag(from: PlacePx, to: PlacePx): Promise<void> {
    const [x0, y0] = await this.onScreen(from)
    const [x1, y1] = await this.onScreen(to)
    await this.page.mouse.move(x0, y0)
    await this.page.mouse.down()
    await this.page.mouse.move((x0 + x1) / 2, (y0 + y1) / 2, { steps: 8 })
    await this.page.mouse.move(x1, y1, { steps: 8 })
    await this.page.mouse.up()
  }

  private async onScreen([x, y]: PlacePx): Promise<[number, number]> {
    const box = await this.photo.boundingBox()
    if (!box) throw new Error('the photograph is not on the screen')
    const of = async (name: string) => Number(await this.photo.getAttribute(name))
    const scale = await of('data-scale')
    return [box.x + x * scale + (await of('data-offset-x')), box.y + y * scale + (await of('data-offset-y'))]
  }
}
