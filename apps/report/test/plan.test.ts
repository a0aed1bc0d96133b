import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type LiveSheet, openLiveSheet, watchedPage } from './browser.ts';

let sheet: LiveSheet;
beforeAll(async () => {
  sheet = await openLiveSheet();
});
afterAll(async () => {
  await sheet?.close();
});

interface Plan {
  readonly page: Page;
  readonly errors: readonly string[];
  readonly svg: Locator;
  readonly words: Locator;
  /** a word of the plan */
  word(name: string): Locator;
  /** a share of the plan's width and height, pixels of the page */
  at(across: number, down: number): Promise<[number, number]>;
  drag(from: [number, number], to: [number, number]): Promise<void>;
  computed(): Promise<void>;
  /** what undoing would take back */
  undoable(): Promise<string | null>;
  /** the reading under the plan */
  reading(): Promise<string>;
}

async function openPlan(viewport = { width: 1180, height: 900 }): Promise<Plan> {
  const { page, errors } = await watchedPage(sheet);
  await page.setViewportSize(viewport);
  // places of the page are read between two gestures, which a gliding page would belie
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await page.goto(sheet.url);
  await page.getByRole('button', { name: 'Try the demonstration study' }).click();
  const computed = async (): Promise<void> => {
    await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
  };
  await computed();
  const svg = page.locator('.plan-svg');
  await svg.evaluate((element) => element.scrollIntoView({ block: 'center', behavior: 'instant' }));
  const words = page.locator('.instrument');
  return {
    page,
    errors,
    svg,
    words,
    computed,
    word: (name) => words.getByRole('button', { name, exact: true }),
    at: async (across, down) => {
      const box = (await svg.boundingBox())!;
      return [box.x + across * box.width, box.y + down * box.height];
    },
    drag: async (from, to) => {
      await page.mouse.move(...from);
      await page.mouse.down();
      await page.mouse.move((from[0] + to[0]) / 2, (from[1] + to[1]) / 2);
      await page.mouse.move(...to);
      await page.mouse.up();
    },
    undoable: () => page.locator('.strip').getByRole('button', { name: 'undo' }).getAttribute('title'),
    reading: async () => (await page.locator('.plan-reading').textContent()) ?? '',
  };
}

/** Pixels of the page at which a place of the ground lies, by the plan's own transform. */
async function pixelOf(plan: Plan, x: number, y: number): Promise<[number, number]> {
  return plan.svg.evaluate(
    (svg, [east, north]) => {
      svg.scrollIntoView({ block: 'center', behavior: 'instant' });
      const group = svg.querySelector('.metal')?.parentElement;
      if (!(group instanceof SVGGraphicsElement)) throw new Error('no metal is drawn');
      const at = new DOMPoint(east, north).matrixTransform(group.getScreenCTM()!);
      return [at.x, at.y] as [number, number];
    },
    [x, y] as const,
  );
}

const rodFact = (rods: number): string => `${rods} rods`;

describe('the plan', () => {
  it('takes a rod by a click, which the sheet counts once computed, and undo takes back', async () => {
    const plan = await openPlan();
    const { page } = plan;
    const before = Number(
      (await page.locator('#electrode .margin').textContent())!.match(/(\d+)\srods/u)![1],
    );
    await plan.word('rod').click();
    // near where two conductors cross, so that the rod is joined to them
    await page.mouse.click(...(await pixelOf(plan, 5.2, 17.9)));
    await expect.poll(plan.undoable).toMatch(/rod R-\d+ drawn/);
    await page
      .locator('#electrode .margin')
      .getByText(rodFact(before + 1))
      .waitFor({ timeout: 60_000 });
    await page.keyboard.press('Control+z');
    await page.locator('#electrode .margin').getByText(rodFact(before)).waitFor({ timeout: 60_000 });
    expect(plan.errors).toEqual([]);
    await page.context().close();
  });

  it('draws a conductor with a typed length, moves it by arrow keys, copies and deletes it', async () => {
    const plan = await openPlan();
    const { page, svg } = plan;
    await plan.word('conductor').click();
    await page.mouse.click(...(await pixelOf(plan, 0, 0)));
    await plan.words.getByLabel('to', { exact: true }).fill('12 m @ 30');
    await plan.words.getByLabel('to', { exact: true }).press('Enter');
    await expect.poll(plan.undoable).toMatch(/conductor L-01 drawn/);
    await svg.focus();
    await page.keyboard.press('Escape');
    await page.keyboard.press('Escape');
    await expect.poll(() => plan.word('select').getAttribute('aria-pressed')).toBe('true');
    await page.mouse.click(...(await pixelOf(plan, 6 * Math.sqrt(3) * 0.8, 6 * 0.8)));
    await plan.words.getByText('conductor L-01 chosen').waitFor();
    await page.keyboard.press('ArrowUp');
    await expect.poll(plan.undoable).toMatch(/conductor L-01 moved 0\.5\sm north/u);
    await page.keyboard.press('Control+c');
    await page.keyboard.press('Control+v');
    await expect.poll(plan.undoable).toMatch(/conductor L-01 copied/);
    await plan.words.getByText('conductor L-01-2 chosen').waitFor();
    await page.keyboard.press('Delete');
    await expect.poll(plan.undoable).toMatch(/conductor L-01-2 deleted/);
    await plan.computed();
    expect(plan.errors).toEqual([]);
    await page.context().close();
  });

  it('says beside the field why a typed end is none', async () => {
    const plan = await openPlan();
    await plan.word('conductor').click();
    await plan.page.mouse.click(...(await pixelOf(plan, 0, 0)));
    const field = plan.words.getByLabel('to', { exact: true });
    await field.fill('12 m @ north');
    await field.press('Enter');
    await plan.words.getByText('north is no angle').waitFor();
    expect(await field.getAttribute('aria-invalid')).toBe('true');
    await plan.page.context().close();
  });

  it('draws a mesh by two points', async () => {
    const plan = await openPlan();
    await plan.word('mesh').click();
    await plan.words.getByLabel('meshes east').fill('2');
    await plan.words.getByLabel('meshes east').press('Tab');
    await plan.page.mouse.click(...(await pixelOf(plan, 13.5, 26)));
    await plan.page.mouse.click(...(await pixelOf(plan, 23, 30.5)));
    await expect.poll(plan.undoable).toMatch(/mesh of 2 by 4 drawn/);
    await plan.words.getByText('8 conductors chosen').waitFor();
    await plan.computed();
    expect(plan.errors).toEqual([]);
    await plan.page.context().close();
  });

  it('is taken to a worst place by its button, and from the figure of the electrode', async () => {
    const plan = await openPlan();
    const { page, svg } = plan;
    const whole = await svg.locator('.frame-marks').textContent();
    await page
      .getByRole('button', { name: /^show on the plan/ })
      .first()
      .click();
    await expect.poll(() => svg.locator('.frame-marks').textContent()).not.toBe(whole);
    await expect.poll(() => svg.evaluate((element) => element === document.activeElement)).toBe(true);
    await plan.word('whole plan').click();
    await expect.poll(() => svg.locator('.frame-marks').textContent()).toBe(whole);
    await page.getByRole('button', { name: 'draw and edit on the plan of voltages' }).click();
    await expect.poll(() => svg.evaluate((element) => element === document.activeElement)).toBe(true);
    // the whole plan comes into the window
    await expect
      .poll(async () => {
        const { y, height } = (await svg.boundingBox())!;
        return y >= 0 && y + height <= 900;
      })
      .toBe(true);
    await page.context().close();
  });

  it('draws a profile along a dragged line, whose ends can be dragged on', async () => {
    const plan = await openPlan();
    const curve = plan.words.getByRole('img', { name: 'Along the line drawn' });
    await plan.word('profile').click();
    await plan.drag(await pixelOf(plan, 2, 22), await pixelOf(plan, 34, 22));
    await curve.waitFor();
    const drawn = await curve.innerHTML();
    await plan.word('select').click();
    await plan.drag(await pixelOf(plan, 34, 22), await pixelOf(plan, 34, 42));
    await expect.poll(() => curve.innerHTML()).not.toBe(drawn);
    await plan.word('drop the profile').click();
    await curve.waitFor({ state: 'detached' });
    expect(plan.errors).toEqual([]);
    await plan.page.context().close();
  });

  it('moves a corner of an area by dragging, adds one on an edge, and takes coordinates by keyboard', async () => {
    const plan = await openPlan();
    const corners = plan.words.getByRole('group', { name: 'Corners of the covered area' });
    await plan.words.getByRole('button', { name: 'covered area', exact: true }).last().click();
    await expect.poll(() => corners.getByRole('listitem').count()).toBe(6);
    // the corner at (63, 27) of the demonstration study
    await plan.drag(await pixelOf(plan, 63, 27), await pixelOf(plan, 65, 29));
    await expect.poll(plan.undoable).toMatch(/corner 3 of the covered area moved to \(65\.0,\s29\.0\)/u);
    // results that come in change the height of what stands above the plan
    await plan.computed();
    await plan.drag(await pixelOf(plan, 30, -3), await pixelOf(plan, 30, -5));
    await expect.poll(plan.undoable).toMatch(/corner added to the covered area at \(30\.0,\s\u22125\.0\)/u);
    await expect.poll(() => corners.getByRole('listitem').count()).toBe(7);
    const east = corners.getByLabel('corner 1 east');
    await east.fill('-4 m');
    await east.press('Enter');
    await expect.poll(plan.undoable).toMatch(/corner 1 of the covered area moved to \(\u22124\.0,/u);
    await corners.getByRole('button', { name: 'remove corner 2' }).click();
    await expect.poll(() => corners.getByRole('listitem').count()).toBe(6);
    await plan.word('touch area, as supposed').click();
    await expect.poll(plan.undoable).toMatch(/touch area given as it was supposed/);
    await plan.words.getByRole('group', { name: 'Corners of the touch area' }).waitFor();
    await plan.computed();
    expect(plan.errors).toEqual([]);
    await plan.page.context().close();
  });

  it('is used whole by keyboard', async () => {
    const plan = await openPlan();
    const { page, svg } = plan;
    await svg.focus();
    await page.keyboard.press('ArrowRight');
    await expect.poll(plan.reading).toMatch(/potential .*V, touch .*V/);
    await page.keyboard.press('Control+a');
    await plan.words.getByText(/conductors and \d+ rods chosen/).waitFor();
    await page.keyboard.press('Escape');
    await plan.words.getByText(/ chosen$/).waitFor({ state: 'detached' });
    await plan.word('rod').focus();
    await page.keyboard.press('Enter');
    await svg.focus();
    await page.keyboard.press('Shift+ArrowDown');
    await page.keyboard.press('Enter');
    await expect.poll(plan.undoable).toMatch(/rod R-\d+ drawn/);
    // from the plan, Tab goes on to what it shows
    await page.keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('touch');
    await page.context().close();
  });

  it('enlarges about the pointer, and by the wheel only once it has been pressed', async () => {
    const plan = await openPlan();
    const { page, svg } = plan;
    const pixel = await pixelOf(plan, 20, 21);
    const marks = (): Promise<string | null> => svg.locator('.frame-marks').textContent();
    const whole = await marks();
    await page.mouse.move(...pixel);
    // a plan that is not in use lets the page scroll
    const scrolled = (): Promise<number> => page.evaluate(() => scrollY);
    const before = await scrolled();
    await page.mouse.wheel(0, 40);
    await expect.poll(scrolled).toBe(before + 40);
    expect(await marks()).toBe(whole);
    await page.mouse.dblclick(...(await pixelOf(plan, 20, 21)));
    await expect.poll(marks).not.toBe(whole);
    const larger = await marks();
    expect(await pixelOf(plan, 20, 21)).toEqual(pixel.map((value) => expect.closeTo(value, -1)));
    await page.mouse.wheel(0, -300);
    await expect.poll(marks).not.toBe(larger);
    expect(await pixelOf(plan, 20, 21)).toEqual(pixel.map((value) => expect.closeTo(value, -1)));
    await page.context().close();
  });

  it('draws nothing of the sheet anew while the pointer moves and the plan is dragged', async () => {
    const plan = await openPlan();
    const { page } = plan;
    await page.evaluate(() => {
      const counted = { outside: 0, ground: 0 };
      Object.assign(globalThis, { counted });
      const instrument = document.querySelector('.instrument')!;
      new MutationObserver((records) => {
        for (const { target } of records) {
          if (!instrument.contains(target)) counted.outside += 1;
          else if (target instanceof Element && target.closest('.map-ground > *')) counted.ground += 1;
        }
      }).observe(document.querySelector('#page')!, {
        subtree: true,
        childList: true,
        attributes: true,
        characterData: true,
      });
    });
    // figures are drawn one by one after the results are there
    await expect
      .poll(
        () =>
          page.evaluate(async () => {
            const { counted } = globalThis as unknown as { counted: { outside: number; ground: number } };
            Object.assign(counted, { outside: 0, ground: 0 });
            await new Promise((resolve) => setTimeout(resolve, 500));
            return counted.outside;
          }),
        { timeout: 20_000 },
      )
      .toBe(0);
    const marks = await plan.svg.locator('.frame-marks').textContent();
    const [x, y] = await plan.at(0.93, 0.1);
    for (let k = 0; k < 20; k += 1) await page.mouse.move(x - 5 * k, y + 5 * k);
    await plan.drag([x, y], [x - 200, y + 150]);
    await expect.poll(() => plan.svg.locator('.frame-marks').textContent()).not.toBe(marks);
    const counted = await page.evaluate(() => (globalThis as unknown as { counted: object }).counted);
    expect(counted).toEqual({ outside: 0, ground: 0 });
    await page.context().close();
  });

  it('shows leakage by thickness, or nothing, and prints the figure of the frozen sheet', async () => {
    const plan = await openPlan();
    const { page, svg } = plan;
    await plan.word('leakage').click();
    expect(await svg.locator('path.leak').count()).toBeGreaterThan(4);
    await plan.words.getByText(/leakage per metre, times the mean of/).waitFor();
    await plan.word('nothing').click();
    expect(await svg.locator('path.leak, .map-ground').count()).toBe(0);
    await plan.word('step').click();
    await page.evaluate(() => dispatchEvent(new Event('beforeprint')));
    await page.emulateMedia({ media: 'print' });
    await plan.words.getByRole('img', { name: /^Step voltage/ }).waitFor();
    expect(await svg.isVisible()).toBe(false);
    await page.emulateMedia({ media: 'screen' });
    await page.evaluate(() => dispatchEvent(new Event('afterprint')));
    await svg.waitFor();
    await plan.words.getByRole('img', { name: /^Step voltage/ }).waitFor({ state: 'detached' });
    await page.context().close();
  });
});

describe('the plan on a phone', () => {
  it('is dragged by one finger and enlarged by two, and leaves ground to scroll the page on', async () => {
    const context = await sheet.browser.newContext({
      viewport: { width: 390, height: 844 },
      hasTouch: true,
      isMobile: true,
    });
    const page = await context.newPage();
    await page.goto(sheet.url);
    await page.getByRole('button', { name: 'Try the demonstration study' }).click();
    await page.getByText('Computed.', { exact: true }).waitFor({ timeout: 60_000 });
    const svg = page.locator('.plan-svg');
    await svg.evaluate((element) => element.scrollIntoView({ block: 'center', behavior: 'instant' }));
    const box = (await svg.boundingBox())!;
    expect(box.height).toBeLessThanOrEqual(0.5 * 844);
    const marks = (): Promise<string | null> => svg.locator('.frame-marks').textContent();
    const bar = (): Promise<string | null> => svg.locator('.frame-marks > text').textContent();
    const whole = await marks();
    const scale = await bar();
    const client = await context.newCDPSession(page);
    const touch = async (type: 'touchStart' | 'touchMove' | 'touchEnd', ...points: [number, number][]) => {
      const touchPoints = points.map(([x, y], id) => ({ x: box.x + x, y: box.y + y, id }));
      await client.send('Input.dispatchTouchEvent', { type, touchPoints });
    };
    await touch('touchStart', [180, 20]);
    await touch('touchMove', [160, 60]);
    await touch('touchMove', [80, 140]);
    await touch('touchEnd');
    await expect.poll(marks).not.toBe(whole);
    expect(await bar()).toBe(scale);
    await touch('touchStart', [150, 150], [200, 200]);
    await touch('touchMove', [120, 120], [230, 230]);
    await touch('touchMove', [60, 60], [290, 290]);
    await touch('touchEnd');
    await expect.poll(bar).not.toBe(scale);
    const [content, window] = await page.evaluate(() => [document.documentElement.scrollWidth, innerWidth]);
    expect(content).toBeLessThanOrEqual(window!);
    await context.close();
  });
});
