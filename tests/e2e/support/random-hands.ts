import type { Page } from 'playwright-core';

/** What one careless hand does to a lookup: types something into a field, slides it, or chooses. */
export interface HandDraw {
  /** 0 to 1: which of the fields that are on screen. */
  readonly field: number;
  readonly text: string;
  /** A key on the slider instead of the Keypad. */
  readonly slide: string | null;
  /** 0 to 1: which of the options, where there are any. */
  readonly option: number;
}

export interface HandReport {
  readonly answered: number;
  readonly refused: number;
  /** What must never be on screen, with the draw after which it was. */
  readonly wrong: readonly string[];
}

const ODD = ['', '-', '.', '0', '-1', '999999999', '0.0000001', '00', '-0', '1e9', '1.2.3'];
const SLIDES = ['Home', 'End', 'PageUp', 'PageDown', 'ArrowUp', 'ArrowLeft'];

export function drawHands(count: number, random: () => number): readonly HandDraw[] {
  return Array.from({ length: count }, () => {
    const odd = random() < 0.2 ? ODD[Math.floor(random() * ODD.length)] : undefined;
    const size = 10 ** (random() * 7 - 3);
    const slide = random() < 0.35 ? SLIDES[Math.floor(random() * SLIDES.length)] : undefined;
    return {
      field: random(),
      text: odd ?? `${random() < 0.1 ? '-' : ''}${String(Number(size.toPrecision(3)))}`,
      slide: slide ?? null,
      option: random(),
    };
  });
}

/** Plays the draws inside the page, one a frame, and looks at the screen after each. */
export async function playHands(page: Page, draws: readonly HandDraw[]): Promise<HandReport> {
  return page.evaluate(async (all) => {
    const painted = () =>
      new Promise<void>((resolve) => {
        requestAnimationFrame(() => setTimeout(resolve, 0));
      });
    const elements = (selector: string) => [...document.querySelectorAll<HTMLElement>(selector)];
    const keyOn = (element: Element, key: string) =>
      element.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
    let answered = 0;
    let refused = 0;
    const wrong: string[] = [];
    for (const [i, draw] of all.entries()) {
      const rows = elements('.screen-fields button.field-row').filter(
        (row) => !(row.textContent ?? '').startsWith('Find'),
      );
      if (draw.slide === null || rows.length === 0 || i % 3 === 0) {
        rows[Math.floor(draw.field * rows.length)]?.click();
        await painted();
      }
      const dialog = document.querySelector('dialog[open]');
      if (dialog !== null) {
        const radios = [...dialog.querySelectorAll<HTMLElement>('[role=radio]')];
        radios[Math.floor(draw.option * radios.length)]?.click();
        dialog.querySelector<HTMLElement>('.dialog-close')?.click();
        await painted();
      } else if (draw.slide !== null) {
        const slider = document.querySelector('.screen-fields [role=slider]');
        if (slider !== null) keyOn(slider, draw.slide);
        await painted();
      } else {
        document.querySelector<HTMLElement>('.quantity-value')?.click();
        await painted();
        const pad = document.querySelector('.keypad');
        if (pad !== null) {
          keyOn(pad, 'Delete');
          for (const key of draw.text) keyOn(pad, key);
          keyOn(pad, 'Enter');
          await painted();
          if (document.querySelector('.keypad') !== null) {
            if (document.querySelector('.field-refusal')?.textContent) refused += 1;
            else wrong.push(`${JSON.stringify(draw)}: the Keypad stays without a word`);
            keyOn(pad, 'Escape');
            await painted();
          }
        }
      }
      const text = document.body.textContent;
      if (/NaN|Infinity|undefined|\[object/.test(text))
        wrong.push(`${JSON.stringify(draw)}: ${text.slice(0, 300)}`);
      if (document.querySelector('.area-failed') !== null) {
        wrong.push(`${JSON.stringify(draw)}: the area failed`);
        break;
      }
      if (document.querySelector('.lookup-answer') !== null) answered += 1;
      else if (/No answer here\.\s*\S/.test(text)) refused += 1;
    }
    return { answered, refused, wrong };
  }, draws);
}
